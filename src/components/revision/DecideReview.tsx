import { useState } from "react";
import { failureText, request } from "#lib/client/request.ts";
import { longestNote, reviewDecision } from "#lib/wire/revision.ts";
import { FormMessage } from "../forms/FormMessage.tsx";

interface DecideReviewProps {
  voiceId: string;
  number: number;
}

/** Releases or returns a revision, with a note for its author. */
export function DecideReview({ voiceId, number }: DecideReviewProps) {
  const [note, setNote] = useState("");
  const [fault, setFault] = useState<string | null>(null);
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  const decide = async (decision: "release" | "return") => {
    if (busy) return;
    const checked = reviewDecision.safeParse({ decision, note });
    setFault(checked.error?.issues[0]?.message ?? null);
    if (!checked.success) return document.getElementById("review-note")?.focus();
    setBusy(true);
    setFailure(null);
    const answer = await request(`/api/voices/${voiceId}/revisions/${number}/review`, {
      method: "POST",
      body: checked.data,
    });
    if (answer.kind === "done") return window.location.assign(`/voices/${voiceId}/revisions/${number}`);
    setBusy(false);
    setFailure(failureText(answer));
  };

  return (
    <form method="post" onSubmit={(event) => event.preventDefault()}>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <div className="field">
        <label htmlFor="review-note">Note with the decision</label>
        <textarea
          id="review-note"
          className="input"
          rows={3}
          maxLength={longestNote}
          value={note}
          aria-invalid={fault !== null || undefined}
          aria-describedby="review-note-note"
          onChange={(event) => setNote(event.target.value)}
        />
        <p id="review-note-note" className={fault === null ? "field-note" : "field-note error"}>
          {fault ?? "The author is told by e-mail. To return it, say what has to change."}
        </p>
      </div>
      <p className="mt-2 flex flex-wrap gap-2">
        <button type="button" className="btn btn-primary" aria-disabled={busy} onClick={() => void decide("release")}>
          Release revision {number}
        </button>
        <button type="button" className="btn" aria-disabled={busy} onClick={() => void decide("return")}>
          Return to the author
        </button>
      </p>
    </form>
  );
}
