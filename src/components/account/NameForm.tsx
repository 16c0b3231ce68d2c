import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { auth } from "#lib/client/auth.ts";
import { refusal } from "#lib/client/authProblem.ts";
import { accountNameInput } from "#lib/wire/account.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export function NameForm({ name }: { name: string }) {
  const [outcome, setOutcome] = useState<{ saved: boolean; text: string } | null>(null);
  const form = useForm({ resolver: zodResolver(accountNameInput), defaultValues: { name } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setOutcome(null);
    const refused = await refusal(auth.updateUser(entries));
    setOutcome(refused !== null ? { saved: false, text: refused } : { saved: true, text: `Saved as ${entries.name}.` });
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {outcome !== null && <FormMessage kind={outcome.saved ? "done" : "fault"}>{outcome.text}</FormMessage>}
      <TextField
        label="Your name"
        autoComplete="name"
        hint="As it stands in the title block"
        registration={form.register("name")}
        error={errors.name?.message}
      />
      <p className="mt-2">
        <SubmitButton label="Save the name" busyLabel="Saving…" busy={isSubmitting} />
      </p>
    </form>
  );
}
