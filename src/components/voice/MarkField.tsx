import { readDesignator } from "#lib/client/stage/marks.ts";

interface MarkFieldProps {
  /** Of which part. */
  label: string;
  text: string;
  faulty: boolean;
  /** Where the fault is said. */
  noteId: string;
  onText: (text: string) => void;
}

/** A part's reference designator, typed over in place. */
export function MarkField({ label, text, faulty, noteId, onText }: MarkFieldProps) {
  return (
    <input
      type="text"
      className="input input-cell input-mark"
      aria-label={`Designator of ${label}`}
      aria-invalid={faulty || undefined}
      aria-describedby={noteId}
      autoComplete="off"
      autoCapitalize="characters"
      spellCheck={false}
      maxLength={12}
      value={text}
      onChange={(event) => onText(event.target.value)}
      onFocus={(event) => event.target.select()}
      onBlur={() => text !== readDesignator(text) && onText(readDesignator(text))}
    />
  );
}
