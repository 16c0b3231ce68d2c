import type { KeyboardEvent } from "react";
import type { Reading } from "#lib/wire/figureText.ts";
import { useField, type FieldName, type FieldStore } from "./fieldStore.ts";

interface QuantityInputProps {
  fields: FieldStore;
  name: FieldName;
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
export function QuantityInput({ fields, name, read, print, step, onValue, ...input }: QuantityInputProps) {
  const { text, fault } = useField(fields, name);
  const onKeyDown = (event: KeyboardEvent) => {
    if (input.readOnly || (event.key !== "ArrowUp" && event.key !== "ArrowDown")) return;
    event.preventDefault();
    const value = step(event.key === "ArrowUp" ? 1 : -1, event.shiftKey ? 10 : 1);
    fields.set(name, print(value));
    onValue(value);
  };
  return (
    <input
      name={name}
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
      aria-invalid={fault !== undefined || input.refused || undefined}
      aria-describedby={input.describedBy}
      onChange={(event) => {
        const reading = read(event.target.value);
        fields.set(name, event.target.value, reading.ok ? undefined : reading.message);
        if (reading.ok) onValue(reading.value);
      }}
      onFocus={(event) => {
        event.target.select();
        input.onFocus?.();
      }}
      onBlur={() => {
        const reading = read(text);
        if (reading.ok && !input.readOnly) fields.set(name, print(reading.value));
        input.onBlur?.();
      }}
      onKeyDown={onKeyDown}
    />
  );
}
