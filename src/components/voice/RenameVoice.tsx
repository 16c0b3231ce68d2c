import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { failureText, request } from "#lib/client/request.ts";
import { voiceChange } from "#lib/wire/voice.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export function RenameVoice({ voiceId, name }: { voiceId: string; name: string }) {
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(voiceChange), defaultValues: { name } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setFailure(null);
    const answer = await request(`/api/voices/${voiceId}`, { method: "PATCH", body: entries });
    if (answer.kind !== "done") return setFailure(failureText(answer));
    // The name stands in the heading, the trail and the title block: the page draws them all anew.
    window.location.reload();
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <TextField
        label="Name of the voice"
        autoComplete="off"
        registration={form.register("name")}
        error={errors.name?.message}
        idPrefix="rename"
      />
      <p className="mt-2">
        <SubmitButton label="Rename" busyLabel="Renaming…" busy={isSubmitting} />
      </p>
    </form>
  );
}
