import { useFormState, type Control, type FieldPath } from "react-hook-form";
import type { StageFields } from "./fields.ts";

interface FieldNoteProps {
  control: Control<StageFields>;
  /** The first of these that has a fault speaks. */
  names: FieldPath<StageFields>[];
  id: string;
  hint?: string | undefined;
  /** What is computed with while the field holds no figure. */
  inForce: string;
}

/** The space under a field, always kept free: a hint, or what is wrong and what stands meanwhile. */
export function FieldNote({ control, names, id, hint, inForce }: FieldNoteProps) {
  const { errors } = useFormState({ control, name: names });
  const fault = names.map((name) => messageAt(errors, name)).find((message) => message !== undefined);
  return (
    <p id={id} className={fault === undefined ? "field-note" : "field-note error"} aria-live="polite">
      {fault === undefined ? hint : `${fault} Still in force: ${inForce}.`}
    </p>
  );
}

function messageAt(errors: unknown, path: string): string | undefined {
  let place: unknown = errors;
  for (const key of [...path.split("."), "message"]) {
    place = typeof place === "object" && place !== null ? (place as Record<string, unknown>)[key] : undefined;
  }
  return typeof place === "string" && place !== "" ? place : undefined;
}
