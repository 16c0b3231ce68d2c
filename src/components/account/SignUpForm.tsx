import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { passwordLength, signUpInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export function SignUpForm({ next }: { next: string }) {
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(signUpInput), defaultValues: { name: "", email: "", password: "" } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setFailure(null);
    const confirmed = `/verify?${new URLSearchParams({ confirmed: "1", next }).toString()}`;
    const refused = await refusal(auth.signUp.email({ ...entries, callbackURL: confirmed }));
    if (refused !== null) return setFailure(refused);
    window.location.assign(`/verify?${new URLSearchParams({ email: entries.email, next }).toString()}`);
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <TextField
        label="Your name"
        autoComplete="name"
        hint="As it should stand in the title block"
        registration={form.register("name")}
        error={errors.name?.message}
      />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        hint="A message with a link confirms it"
        registration={form.register("email")}
        error={errors.email?.message}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="new-password"
        hint={`${passwordLength.least} characters or more`}
        registration={form.register("password")}
        error={errors.password?.message}
      />
      <p className="mt-2">
        <SubmitButton label="Sign up" busyLabel="Signing up…" busy={isSubmitting} />
      </p>
    </form>
  );
}
