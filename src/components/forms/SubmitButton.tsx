/** Names what is under way; stays focusable meanwhile so that the keyboard keeps its place. */
export function SubmitButton({ label, busyLabel, busy }: { label: string; busyLabel: string; busy: boolean }) {
  return (
    <button type="submit" className="btn btn-primary" aria-disabled={busy}>
      {busy ? busyLabel : label}
    </button>
  );
}
