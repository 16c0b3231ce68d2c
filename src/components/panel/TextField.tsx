import type { ReactNode } from "react";

interface TextFieldProps {
  id: string;
  label: ReactNode;
  value: string;
  onText: (text: string) => void;
  /** Inside the field, after the figure. */
  unit?: string;
  fault?: string | undefined;
  hint?: string;
  readOnly?: boolean;
}

/** One figure of a panel as text, with its fault under it; what is typed stays, readable or not. */
export function TextField({ id, label, value, onText, unit, fault, hint, readOnly = false }: TextFieldProps) {
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      <div className="field-box">
        <input
          id={id}
          className="input"
          type="text"
          autoComplete="off"
          spellCheck={false}
          readOnly={readOnly}
          value={value}
          aria-invalid={fault !== undefined || undefined}
          aria-describedby={`${id}-note`}
          onChange={(event) => onText(event.target.value)}
        />
        {unit !== undefined && <span className="unit">{unit}</span>}
      </div>
      <p id={`${id}-note`} className={fault === undefined ? "field-note" : "field-note error"}>
        {fault ?? hint}
      </p>
    </div>
  );
}
