import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { emailInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

/** Asks for another address. It holds only once both addresses have agreed by mail. */
export function EmailForm({ email }: { email: string }) {
  const [outcome, setOutcome] = useState<{ sent: boolean; text: string } | null>(null);
  const form = useForm({ resolver: zodResolver(emailInput), defaultValues: { email: "" } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setOutcome(null);
    const refused = await refusal(auth.changeEmail({ newEmail: entries.email, callbackURL: "/account" }));
    setOutcome(
      refused !== null
        ? { sent: false, text: refused }
        : {
            sent: true,
            text: `A mail is on its way to ${email}. Open the link in it; then a second one, to ${entries.email}, confirms the change.`,
          },
    );
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {outcome !== null && <FormMessage kind={outcome.sent ? "done" : "fault"}>{outcome.text}</FormMessage>}
      <TextField
        label="New e-mail address"
        type="email"
        autoComplete="email"
        hint={`Now ${email}`}
        registration={form.register("email")}
        error={errors.email?.message}
        idPrefix="new-email"
      />
      <p className="mt-2">
        <SubmitButton label="Change the address" busyLabel="Asking…" busy={isSubmitting} />
      </p>
    </form>
  );
}
