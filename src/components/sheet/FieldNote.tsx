import { TextWithSymbols } from "./TextWithSymbols.tsx";
import { useFirstFault, type FieldName, type FieldStore } from "./fieldStore.ts";

interface NotedField {
  name: FieldName;
  /** What is computed with while the field holds no figure. */
  inForce: string;
  /** Where several fields share the note. */
  label?: string;
}

interface FieldNoteProps {
  store: FieldStore;
  /** The first of these that has a fault speaks. */
  fields: NotedField[];
  id: string;
  hint?: string | undefined;
  /** The hint itself tells of a fault. */
  refused?: boolean;
}

/** The space under a field, always kept free: a hint, or what is wrong and what stands meanwhile. */
export function FieldNote({ store, fields, id, hint, refused = false }: FieldNoteProps) {
  const first = useFirstFault(
    store,
    fields.map(({ name }) => name),
  );
  const faulty = first && fields[first.at];
  return (
    <p id={id} className={faulty || refused ? "field-note error" : "field-note"} aria-live="polite">
      {faulty ? (
        <>
          {faulty.label !== undefined && (
            <>
              <TextWithSymbols text={faulty.label} />:{" "}
            </>
          )}
          {first.fault} Still {faulty.inForce}.
        </>
      ) : (
        hint !== undefined && <TextWithSymbols text={hint} />
      )}
    </p>
  );
}
