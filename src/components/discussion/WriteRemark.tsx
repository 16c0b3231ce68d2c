import { useState, type SyntheticEvent } from "react";
import { longestComment } from "#lib/wire/comment.ts";
import type { PlaceChoice } from "./Discussion.tsx";

interface WriteRemarkProps {
  label: string;
  idPrefix: string;
  people: string[];
  places?: PlaceChoice[];
  /** Shown from the start; an answer is asked for first. */
  open?: boolean;
  onWrite: (text: string, at: PlaceChoice["at"] | undefined) => Promise<boolean>;
}

/** A field to write in. What stands in it stays until it has arrived. */
export function WriteRemark({ label, idPrefix, people, places = [], open = false, onWrite }: WriteRemarkProps) {
  const [shown, setShown] = useState(open);
  const [text, setText] = useState("");
  const [place, setPlace] = useState("");
  const [busy, setBusy] = useState(false);
  const id = `${idPrefix}-text`;

  const send = async (event: SyntheticEvent) => {
    event.preventDefault();
    if (busy || text.trim() === "") return;
    setBusy(true);
    const arrived = await onWrite(text, places.find(({ key }) => key === place)?.at);
    setBusy(false);
    if (!arrived) return;
    setText("");
    setShown(open);
  };

  if (!shown) {
    return (
      <button type="button" className="btn-text text-small" onClick={() => setShown(true)}>
        {label}
      </button>
    );
  }
  return (
    <form method="post" className="mt-3" onSubmit={(event) => void send(event)}>
      {places.length > 0 && (
        <div className="field">
          <label htmlFor={`${idPrefix}-place`}>About</label>
          <select
            id={`${idPrefix}-place`}
            className="input"
            value={place}
            onChange={(event) => setPlace(event.target.value)}
          >
            <option value="">The whole revision</option>
            {places.map(({ key, label: words }) => (
              <option key={key} value={key}>
                {words}
              </option>
            ))}
          </select>
        </div>
      )}
      <div className="field">
        <label htmlFor={id}>{label === "Answer" ? "Your answer" : "Your remark"}</label>
        <textarea
          id={id}
          className="input"
          rows={3}
          maxLength={longestComment}
          value={text}
          aria-describedby={`${id}-note`}
          onChange={(event) => setText(event.target.value)}
        />
        <p id={`${id}-note`} className="field-note">
          {people.length > 0 && `Write @ and a name to tell somebody by e-mail, such as @${people[0]}.`}
        </p>
      </div>
      <p className="mt-2">
        <button type="submit" className="btn" aria-disabled={busy || text.trim() === ""}>
          {label}
        </button>
      </p>
    </form>
  );
}
