import { useState } from "react";
import { failureText, request } from "#lib/client/request.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { Confirmed } from "../voice/Confirmed.tsx";

interface RestoreRevisionProps {
  voiceId: string;
  number: number;
  /** Of the working copy as it was when this page was opened. */
  etag: string;
}

export function RestoreRevision({ voiceId, number, etag }: RestoreRevisionProps) {
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  const restore = async () => {
    setBusy(true);
    setFailure(null);
    const answer = await request(`/api/voices/${voiceId}/revisions/${number}/restore`, {
      method: "POST",
      ifMatch: etag,
    });
    if (answer.kind === "done") return window.location.assign(`/voices/${voiceId}`);
    setBusy(false);
    setFailure(
      answer.kind === "refused" && answer.status === 412
        ? "Somebody saved the working copy since this page was opened. It was left as it is: look at it, load this page again, then decide."
        : failureText(answer),
    );
  };

  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <Confirmed
        label="Restore into the working copy"
        warning={
          <>
            The working copy is replaced by revision {number}. What is in no revision yet will be gone; make a revision
            of it first if you want to keep it.
          </>
        }
        confirmLabel={`Restore revision ${number}`}
        keepLabel="Leave the working copy"
        busy={busy}
        onConfirm={() => void restore()}
      />
    </>
  );
}
