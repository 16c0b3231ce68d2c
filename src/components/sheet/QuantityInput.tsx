import type { KeyboardEvent } from "react";
import { useController, type Control, type FieldPath } from "react-hook-form";
import type { Reading } from "#lib/wire/figureText.ts";
import type { StageFields } from "./fields.ts";

interface QuantityInputProps {
  control: Control<StageFields>;
  name: FieldPath<StageFields>;
  id: string;
  /** Where no visible label points at it. */
  label?: string;
  className?: string;
  read: (text: string) => Reading;
  print: (value: number) => string;
  /** The next value up (1) or down (−1), `count` steps away; from the last good value. */
  step: (direction: 1 | -1, count: number) => number;
  onValue: (value: number) => void;
  onFocus?: () => void;
  onBlur?: () => void;
  describedBy?: string | undefined;
  /** Read well, but refused by the stage as a whole. */
  refused?: boolean;
  readOnly?: boolean;
}

/**
 * One figure, typed as people write it. What cannot be read stays in the field with its fault, while the last good value
 * stays in force.
 */
export function QuantityInput({ control, name, read, print, step, onValue, ...input }: QuantityInputProps) {
  const {
    field: { ref, name: fieldName, value: typed, onChange, onBlur },
    fieldState,
  } = useController({
    control,
    name,
    rules: {
      validate: (text) => {
        const reading = read(String(text));
        return reading.ok || reading.message;
      },
    },
  });
  const text = String(typed);
  const onKeyDown = (event: KeyboardEvent) => {
    if (input.readOnly || (event.key !== "ArrowUp" && event.key !== "ArrowDown")) return;
    event.preventDefault();
    const value = step(event.key === "ArrowUp" ? 1 : -1, event.shiftKey ? 10 : 1);
    onChange(print(value));
    onValue(value);
  };
  return (
    <input
      ref={ref}
      name={fieldName}
      id={input.id}
      className={input.className ?? "input"}
      type="text"
      inputMode="text"
      autoComplete="off"
      autoCapitalize="off"
      spellCheck={false}
      readOnly={input.readOnly}
      value={text}
      aria-label={input.label}
      aria-invalid={fieldState.invalid || input.refused || undefined}
      aria-describedby={input.describedBy}
      onChange={(event) => {
        onChange(event.target.value);
        const reading = read(event.target.value);
        if (reading.ok) onValue(reading.value);
      }}
      onFocus={(event) => {
        event.target.select();
        input.onFocus?.();
      }}
      onBlur={() => {
        const reading = read(text);
        if (reading.ok && !input.readOnly) onChange(print(reading.value));
        onBlur();
        input.onBlur?.();
      }}
      onKeyDown={onKeyDown}
    />
  );
}
