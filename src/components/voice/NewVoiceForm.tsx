import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { failureText, request } from "#lib/client/request.ts";
import { newVoice } from "#lib/wire/voice.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

const templates = [
  { id: "empty", label: "Empty", holds: "No stages yet; size the first one yourself" },
  {
    id: "two-path-noise",
    label: "Two-path noise voice",
    holds: "Noise through a band-pass, split into two cells, each with its own envelope",
  },
  { id: "struck-tone", label: "Struck tone", holds: "A trigger rings a resonator, then the output driver" },
] as const;

export function NewVoiceForm() {
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({
    resolver: zodResolver(newVoice),
    defaultValues: { name: "", template: "empty" },
  });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async (entries) => {
    setFailure(null);
    const answer = await request<{ id: string }>("/api/voices", { method: "POST", body: entries });
    if (answer.kind !== "done") return setFailure(failureText(answer));
    window.location.assign(`/voices/${answer.body.id}`);
  });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <TextField
        label="Name of the voice"
        autoComplete="off"
        registration={form.register("name")}
        error={errors.name?.message}
        idPrefix="new-voice"
      />
      <fieldset className="field">
        <legend>Start from</legend>
        {templates.map(({ id, label, holds }) => (
          <div className="choice" key={id}>
            <input type="radio" id={`template-${id}`} value={id} {...form.register("template")} />
            <div>
              <label htmlFor={`template-${id}`} className="!mb-0 !text-body !text-ink">
                {label}
              </label>
              <p className="text-small text-ink-2">{holds}</p>
            </div>
          </div>
        ))}
      </fieldset>
      <p className="mt-3">
        <SubmitButton label="Create the voice" busyLabel="Creating…" busy={isSubmitting} />
      </p>
    </form>
  );
}
