import type { InputHTMLAttributes } from "react";
import type { UseFormRegisterReturn } from "react-hook-form";

interface TextFieldProps extends Pick<
  InputHTMLAttributes<HTMLInputElement>,
  "type" | "autoComplete" | "inputMode" | "readOnly"
> {
  label: string;
  hint?: string;
  error?: string | undefined;
  registration: UseFormRegisterReturn;
  /** Sets the ids apart when a page has the same field twice. */
  idPrefix?: string;
}

/** Label above, one line always kept free beneath for a hint or an error, so that nothing jumps. */
export function TextField({
  label,
  hint,
  error,
  registration,
  idPrefix = "field",
  type = "text",
  ...input
}: TextFieldProps) {
  const id = `${idPrefix}-${registration.name}`;
  return (
    <div className="field">
      <label htmlFor={id}>{label}</label>
      <div className="field-box">
        <input
          {...registration}
          {...input}
          id={id}
          type={type}
          className="input"
          aria-invalid={error !== undefined}
          aria-describedby={`${id}-note`}
        />
      </div>
      <p id={`${id}-note`} className={error === undefined ? "field-note" : "field-note error"}>
        {error ?? hint}
      </p>
    </div>
  );
}
