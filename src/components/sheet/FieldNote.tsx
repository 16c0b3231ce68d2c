import { useFormState, type Control, type FieldPath } from "react-hook-form";
import { TextWithSymbols } from "./TextWithSymbols.tsx";
import type { StageFields } from "./fields.ts";

interface NotedField {
  name: FieldPath<StageFields>;
  /** What is computed with while the field holds no figure. */
  inForce: string;
  /** Where several fields share the note. */
  label?: string;
}

interface FieldNoteProps {
  control: Control<StageFields>;
  /** The first of these that has a fault speaks. */
  fields: NotedField[];
  id: string;
  hint?: string | undefined;
  /** The hint itself tells of a fault. */
  refused?: boolean;
}

/** The space under a field, always kept free: a hint, or what is wrong and what stands meanwhile. */
export function FieldNote({ control, fields, id, hint, refused = false }: FieldNoteProps) {
  const { errors } = useFormState({ control, name: fields.map(({ name }) => name) });
  const faulty = fields.find(({ name }) => messageAt(errors, name) !== undefined);
  const label = faulty?.label === undefined ? "" : `${faulty.label}: `;
  return (
    <p id={id} className={faulty || refused ? "field-note error" : "field-note"} aria-live="polite">
      {faulty
        ? `${label}${messageAt(errors, faulty.name)} Still ${faulty.inForce}.`
        : hint !== undefined && <TextWithSymbols text={hint} />}
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
