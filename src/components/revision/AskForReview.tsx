import { useState, type SyntheticEvent } from "react";
import { failureText, request } from "#lib/client/request.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { SubmitButton } from "../forms/SubmitButton.tsx";

interface AskForReviewProps {
  voiceId: string;
  number: number;
  people: { userId: string; name: string; role: string }[];
  /** Whether somebody was asked already. */
  again: boolean;
}

export function AskForReview({ voiceId, number, people, again }: AskForReviewProps) {
  const [reviewer, setReviewer] = useState("");
  const [failure, setFailure] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  const send = async (event: SyntheticEvent) => {
    event.preventDefault();
    setBusy(true);
    setFailure(null);
    const body = reviewer === "" ? {} : { reviewer };
    const answer = await request(`/api/voices/${voiceId}/revisions/${number}/review-request`, { method: "POST", body });
    if (answer.kind === "done") return window.location.reload();
    setBusy(false);
    setFailure(failureText(answer));
  };

  if (people.length === 0) {
    return (
      <p className="text-ink-2">
        Nobody in the team can review this: it takes a reviewer or an owner other than its author. An owner invites one.
      </p>
    );
  }
  return (
    <form method="post" onSubmit={(event) => void send(event)}>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <div className="field">
        <label htmlFor="review-by">Review by</label>
        <select id="review-by" className="input" value={reviewer} onChange={(event) => setReviewer(event.target.value)}>
          <option value="">Anyone who may review</option>
          {people.map(({ userId, name, role }) => (
            <option key={userId} value={userId}>
              {name}, {role}
            </option>
          ))}
        </select>
        <p className="field-note">They are told by e-mail.</p>
      </div>
      <p className="mt-2">
        <SubmitButton label={again ? "Ask again" : "Ask for review"} busyLabel="Asking…" busy={busy} />
      </p>
    </form>
  );
}
