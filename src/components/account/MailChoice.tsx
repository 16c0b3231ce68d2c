import { useState } from "react";
import { FormMessage } from "../forms/FormMessage.tsx";
import { failureText, request } from "#lib/client/request.ts";

/** Whether mentions come by mail; it is kept as soon as it is ticked. */
export function MailChoice({ mentions: first }: { mentions: boolean }) {
  const [mentions, setMentions] = useState(first);
  const [outcome, setOutcome] = useState<{ kept: boolean; text: string } | null>(null);
  const choose = async (wanted: boolean) => {
    setMentions(wanted);
    const answer = await request("/api/account/mail", { method: "PUT", body: { mentions: wanted } });
    if (answer.kind === "done") return setOutcome({ kept: true, text: "Kept." });
    setMentions(!wanted);
    setOutcome({ kept: false, text: failureText(answer) });
  };
  return (
    <>
      {outcome !== null && <FormMessage kind={outcome.kept ? "done" : "fault"}>{outcome.text}</FormMessage>}
      <div className="choice">
        <input
          type="checkbox"
          id="mail-mentions"
          checked={mentions}
          onChange={(event) => void choose(event.target.checked)}
        />
        <label htmlFor="mail-mentions" className="!mb-0 !text-ink">
          A mail when somebody mentions me
        </label>
      </div>
    </>
  );
}
