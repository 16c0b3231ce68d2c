import type { ReactNode } from "react";
import { formatPartValue, formatQuantity, formatTyped, midSentence, type PartField } from "#lib/circuit/index.ts";
import { stepPart } from "#lib/client/stage/stepping.ts";
import { notFitted, partText, readFigure } from "#lib/wire/figureText.ts";
import { seriesOf } from "#lib/wire/stageState.ts";
import { FieldNote } from "./FieldNote.tsx";
import { QuantityInput } from "./QuantityInput.tsx";
import { SymbolText } from "./SymbolText.tsx";
import type { Stage } from "./useStage.ts";

/** Designators that can be typed over. */
export interface PartMarks {
  field: (part: string, noteId: string) => ReactNode;
  fault: string | undefined;
}

interface PartsTableProps {
  stage: Stage;
  id: string;
  designators: Record<string, string>;
  marks: PartMarks | undefined;
  readOnly: boolean;
  /** Tells which part's field has the focus, so that the network can show it. */
  onLit: (part: string | undefined) => void;
}

/** The parts: what the targets call for exactly, and what is chosen. */
export function PartsTable({ stage, id, designators, marks, readOnly, onLit }: PartsTableProps) {
  const { topology, watched, exact, moves } = stage;
  const entries = Object.entries(topology.parts);
  if (entries.length === 0) return <p className="text-ink-2">This network has no parts of its own to choose.</p>;
  const result = topology.results[watched]!;
  const anyMoves = Object.keys(moves).length > 0;
  return (
    <>
      <table className="table parts-table">
        <thead>
          <tr>
            <th scope="col">Part</th>
            <th scope="col" className="right">
              Exact
            </th>
            <th scope="col" className="right">
              Chosen
            </th>
            <th scope="col" className="right">
              Tolerance
            </th>
            {anyMoves && (
              <th scope="col" className="right only-wide">
                Moves <SymbolText symbol={result.symbol} />
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {entries.map(([key, field]) => (
            <PartRow
              key={key}
              stage={stage}
              part={key}
              field={field}
              id={`${id}-${key}`}
              designator={designators[key]}
              markField={marks?.field(key, `${id}-note`) || undefined}
              exact={exact?.[key]}
              moves={anyMoves ? (moves[key] ?? null) : undefined}
              readOnly={readOnly}
              onLit={onLit}
            />
          ))}
        </tbody>
      </table>
      <FieldNote
        store={stage.fields}
        fields={entries.map(([key, field]) => ({
          name: `parts.${key}` as const,
          inForce: formatPartValue(stage.state.parts[key]!, field.unit),
          label: designators[key] ?? field.symbol,
        }))}
        id={`${id}-note`}
        refused={marks?.fault !== undefined}
        hint={
          readOnly
            ? undefined
            : (marks?.fault ??
              "↑ ↓ step along the series, with Shift by ten." +
                (anyMoves ? ` “Moves”: per cent of ${midSentence(result.label)} for one per cent of the part.` : ""))
        }
      />
    </>
  );
}

interface PartRowProps {
  stage: Stage;
  part: string;
  field: PartField;
  id: string;
  designator: string | undefined;
  /** Stands in place of the designator where that can be typed over. */
  markField: ReactNode;
  exact: number | undefined;
  /** Null where this part has none, undefined where no part has. */
  moves: number | null | undefined;
  readOnly: boolean;
  onLit: (part: string | undefined) => void;
}

function PartRow({ stage, part, field, id, designator, markField, exact, moves, readOnly, onLit }: PartRowProps) {
  const { state, fields, actions } = stage;
  const value = state.parts[part]!;
  const series = seriesOf(field.partClass, state.series);
  return (
    <tr>
      <th scope="row" className={markField ? "with-mark-field" : undefined}>
        {markField}
        <label htmlFor={id}>
          <span className={markField ? "sr-only" : "val part-mark"}>
            {designator ?? <SymbolText symbol={field.symbol} />}
          </span>{" "}
          <span className="text-ink-2">{field.label}</span>
        </label>
      </th>
      <td className="right val dim">{exactText(exact, field)}</td>
      <td className="right">
        <QuantityInput
          fields={fields}
          name={`parts.${part}`}
          id={id}
          className="input input-cell"
          read={(text) => readFigure(text, field)}
          print={(figure) => partText(figure, field.unit)}
          step={(direction, count) => stepPart(value, field, series, direction, count)}
          onValue={(figure) => actions.set("parts", part, figure)}
          onFocus={() => onLit(part)}
          onBlur={() => onLit(undefined)}
          describedBy={`${id.slice(0, -part.length - 1)}-note`}
          readOnly={readOnly}
        />
      </td>
      <td className="right text-ink-2">± {Number((field.tolerance * 100).toPrecision(3))} %</td>
      {moves !== undefined && (
        <td className="right text-ink-2 only-wide">
          {moves === null ? "–" : formatQuantity(moves, "dB").replace(/\u00a0dB$/, "")}
        </td>
      )}
    </tr>
  );
}

function exactText(exact: number | undefined, field: PartField): string {
  if (exact === undefined) return "–";
  if (exact === 0) return notFitted;
  const marked = formatPartValue(exact, field.unit);
  return partIsPlain(exact, marked, field) ? marked : formatTyped(exact, field.unit, 4);
}

/** A decided part's exact value is its own: shown in the same hand. */
const partIsPlain = (exact: number, marked: string, field: PartField) => {
  const reading = readFigure(marked, field);
  return reading.ok && reading.value === exact;
};
