import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { newPasswordInput, passwordLength } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export function NewPasswordForm({ token }: { token: string }) {
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(newPasswordInput), defaultValues: { password: "" } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async ({ password }) => {
    setFailure(null);
    const refused = await refusal(auth.resetPassword({ newPassword: password, token }));
    if (refused !== null) return setFailure(refused);
    window.location.assign("/sign-in?password=changed");
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <TextField
        label="New password"
        type="password"
        autoComplete="new-password"
        hint={`${passwordLength.least} characters or more`}
        registration={form.register("password")}
        error={errors.password?.message}
      />
      <p className="mt-2">
        <SubmitButton label="Set the password" busyLabel="Setting…" busy={isSubmitting} />
      </p>
    </form>
  );
}
