import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { failureText, request } from "#lib/client/request.ts";
import { newRevision } from "#lib/wire/revision.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";
import { TextField } from "../forms/TextField.tsx";

export interface OfferedWarning {
  stage: string;
  stageName: string;
  code: string;
  message: string;
}

interface MakeRevisionProps {
  voiceId: string;
  /** Of the working copy that is shown, so that nothing is kept that the author has not seen. */
  etag: string;
  /** Cautions and faults of the working copy, to be accepted one by one. */
  warnings: OfferedWarning[];
}

const stale =
  "Somebody saved the working copy since this page was opened, so no revision was made. Your reason is kept here: look at the newer copy, load this page again, then make it.";

export function MakeRevision({ voiceId, etag, warnings }: MakeRevisionProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const [accepted, setAccepted] = useState<ReadonlySet<number>>(new Set());
  const form = useForm({ resolver: zodResolver(newRevision.pick({ reason: true })), defaultValues: { reason: "" } });
  const { errors, isSubmitting } = form.formState;

  const send = form.handleSubmit(async ({ reason }) => {
    setFailure(null);
    const acceptedWarnings = warnings
      .filter((_, index) => accepted.has(index))
      .map(({ stage, code }) => ({ stage, code }));
    const answer = await request<{ number: number }>(`/api/voices/${voiceId}/revisions`, {
      method: "POST",
      body: { reason, acceptedWarnings },
      ifMatch: etag,
    });
    if (answer.kind === "done") return window.location.assign(`/voices/${voiceId}/revisions/${answer.body.number}`);
    setFailure(answer.kind === "refused" && answer.status === 412 ? stale : failureText(answer));
  });

  const toggle = (index: number) =>
    setAccepted((before) => {
      const next = new Set(before);
      if (!next.delete(index)) next.add(index);
      return next;
    });

  return (
    <form method="post" onSubmit={(event) => void send(event)} noValidate>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <TextField
        label="Why this revision, in one line"
        autoComplete="off"
        hint="Such as: trim uses the whole knob; darker band"
        registration={form.register("reason")}
        error={errors.reason?.message}
        idPrefix="new-revision"
      />
      {warnings.length > 0 && (
        <fieldset className="field">
          <legend>Warnings that are meant to stay</legend>
          {warnings.map(({ stage, stageName, code, message }, index) => (
            <div className="choice" key={`${stage} ${code} ${message}`}>
              <input
                type="checkbox"
                id={`accept-${index}`}
                checked={accepted.has(index)}
                onChange={() => toggle(index)}
              />
              <label htmlFor={`accept-${index}`} className="!mb-0 !text-ink">
                <strong>{stageName}:</strong> {message}
              </label>
            </div>
          ))}
        </fieldset>
      )}
      <p className="mt-3">
        <SubmitButton label="Make the revision" busyLabel="Making…" busy={isSubmitting} />
      </p>
    </form>
  );
}
