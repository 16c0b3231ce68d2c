import { useState, type SyntheticEvent } from "react";

interface AcceptFormProps {
  by: string;
  onAccept: (accepted: { reason: string; by: string }) => Promise<void>;
  onClose: () => void;
}

/** Why something that is not right is meant to stay, and who says so. */
export function AcceptForm({ by, onAccept, onClose }: AcceptFormProps) {
  const [reason, setReason] = useState("");
  const [fault, setFault] = useState(false);
  const send = async (event: SyntheticEvent) => {
    event.preventDefault();
    const said = reason.trim();
    setFault(said === "");
    if (said !== "") await onAccept({ reason: said, by });
  };
  return (
    <form className="field mt-1" noValidate onSubmit={(event) => void send(event)}>
      <label htmlFor="accept-reason">Why it is meant to stay; {by} accepts it</label>
      <div className="flex flex-wrap gap-2">
        <input
          id="accept-reason"
          className="input min-w-0 flex-1"
          value={reason}
          maxLength={200}
          autoComplete="off"
          autoFocus
          aria-invalid={fault || undefined}
          aria-describedby="accept-note"
          onChange={(event) => setReason(event.target.value)}
        />
        <button type="submit" className="btn">
          Accept
        </button>
        <button type="button" className="btn" onClick={onClose}>
          Leave it open
        </button>
      </div>
      <p id="accept-note" className={fault ? "field-note error" : "field-note"}>
        {fault && "Say in one line why it is meant to stay."}
      </p>
    </form>
  );
}
