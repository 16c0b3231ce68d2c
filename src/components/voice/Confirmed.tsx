import { useState, type ReactNode } from "react";

interface ConfirmedProps {
  label: string;
  /** What will be gone, said before it is. */
  warning: ReactNode;
  confirmLabel: string;
  keepLabel: string;
  busy: boolean;
  onConfirm: () => void;
}

/** A step that cannot be undone asks once, in place. */
export function Confirmed({ label, warning, confirmLabel, keepLabel, busy, onConfirm }: ConfirmedProps) {
  const [asking, setAsking] = useState(false);
  if (!asking) {
    return (
      <button type="button" className="btn-text" onClick={() => setAsking(true)}>
        {label}
      </button>
    );
  }
  return (
    <div className="fault text-left whitespace-normal" role="group" aria-label={label}>
      <p>{warning}</p>
      <p className="mt-2 flex flex-wrap gap-2">
        <button type="button" className="btn btn-danger" aria-disabled={busy} onClick={() => !busy && onConfirm()}>
          {confirmLabel}
        </button>
        <button type="button" className="btn" autoFocus onClick={() => setAsking(false)}>
          {keepLabel}
        </button>
      </p>
    </div>
  );
}
