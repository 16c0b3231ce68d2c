import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { emailInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

interface SendLinkFormProps {
  purpose: "confirm" | "reset";
  email?: string;
  next?: string;
}

const labels = { confirm: "Send the link again", reset: "Send a link" };

/** Asks for a link by e-mail. The answer is the same whether or not the address has an account. */
export function SendLinkForm({ purpose, email = "", next = "/voices" }: SendLinkFormProps) {
  const [outcome, setOutcome] = useState<{ sent: boolean; text: string } | null>(null);
  const form = useForm({ resolver: zodResolver(emailInput), defaultValues: { email } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setOutcome(null);
    const answer =
      purpose === "reset"
        ? auth.requestPasswordReset({ ...entries, redirectTo: "/reset-password" })
        : auth.sendVerificationEmail({
            ...entries,
            callbackURL: `/verify?${new URLSearchParams({ confirmed: "1", next }).toString()}`,
          });
    const refused = await refusal(answer);
    setOutcome(
      refused !== null
        ? { sent: false, text: refused }
        : { sent: true, text: `If ${entries.email} belongs to an account, a message with a link is on its way to it.` },
    );
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {outcome !== null && <FormMessage kind={outcome.sent ? "done" : "fault"}>{outcome.text}</FormMessage>}
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        registration={form.register("email")}
        error={errors.email?.message}
      />
      <p className="mt-2">
        <SubmitButton label={labels[purpose]} busyLabel="Sending…" busy={isSubmitting} />
      </p>
    </form>
  );
}
