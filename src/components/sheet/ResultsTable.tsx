import { Fragment } from "react";
import { printShown, type Analysis, type ResultField } from "#lib/circuit/index.ts";
import { changeText, errorText } from "#lib/wire/changeText.ts";
import { StateMark } from "../page/StateMark.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TextWithSymbols } from "./TextWithSymbols.tsx";
import type { Stage } from "./useStage.ts";

type ResultValue = Analysis["results"][string];

interface Figure {
  key: string;
  field: ResultField;
  value: ResultValue | undefined;
}

/** What the chosen parts really give, against the targets; and what the surroundings cost where any are switched on. */
export function ResultsTable({ stage, only }: { stage: Stage; only?: readonly string[] }) {
  const { ideal } = stage;
  return (
    <table className="table results-table">
      <caption className={ideal ? "results-caption" : "sr-only"}>
        {ideal ? "Under ideal surroundings → under those switched on" : "Results"}
      </caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Result</th>
          <th scope="col">Figure</th>
          <th scope="col">Against the target</th>
        </tr>
      </thead>
      <tbody>
        {rowsOf(stage, only).map((row) => (
          <ResultRow key={row[0]!.key} stage={stage} row={row} />
        ))}
      </tbody>
    </table>
  );
}

/** Figures of the same name in other units stand in one row: a gain as a ratio and in dB. */
function rowsOf({ topology, analysis }: Stage, only?: readonly string[]): Figure[][] {
  const wanted = new Set(Object.values(topology.targets).map(({ result }) => result));
  const rows: Figure[][] = [];
  for (const [key, field] of Object.entries(topology.results)) {
    if (only?.includes(key) === false) continue;
    const value = analysis.results[key];
    if (value === undefined && !wanted.has(key)) continue;
    const last = rows.at(-1);
    if (last?.[0]!.field.label === field.label) last.push({ key, field, value });
    else rows.push([{ key, field, value }]);
  }
  return rows;
}

function ResultRow({ stage, row }: { stage: Stage; row: Figure[] }) {
  const { topology, analysis, ideal, state } = stage;
  const { field } = row[0]!;
  const target = Object.entries(topology.targets).find(([, { result }]) => row.some(({ key }) => key === result));
  const targetState = target && analysis.state[target[0]];
  const got = target && analysis.results[target[1].result];
  return (
    <tr>
      <th scope="row">
        <TextWithSymbols text={field.label} />
        {field.help !== undefined && (
          <span className="result-help">
            <TextWithSymbols text={field.help} />
          </span>
        )}
      </th>
      <td className="right">
        {row.map(({ key, field, value }, i) => (
          <span key={key} className={i === 0 ? "figure" : "figure figure-also"}>
            <ShownFigure value={value} field={field} />
          </span>
        ))}
        {ideal && <Cost row={row} ideal={ideal} />}
      </td>
      <td className="result-state">
        {target && targetState && (
          <>
            <StateMark state={targetState} />
            {typeof got === "number" && (
              <span className="result-error">
                {errorText(got / state.targets[target[0]]! - 1)}
                <span className="sr-only">
                  {" "}
                  of the target <SymbolText symbol={target[1].symbol} />
                </span>
              </span>
            )}
          </>
        )}
      </td>
    </tr>
  );
}

function ShownFigure({ value, field }: { value: ResultValue | undefined; field: ResultField }) {
  if (value === undefined) return <span className="text-ink-2">no figure</span>;
  if (typeof value !== "number") return <FigureList values={value} field={field} />;
  if (field.words) return value === 0 ? field.words.no : field.words.yes;
  const printed = printShown(value, field);
  return (
    <>
      {printed.figure}
      {printed.unit !== "" && <span className="dim">{printed.unit === "°" ? "°" : ` ${printed.unit}`}</span>}
    </>
  );
}

function FigureList({ values, field }: { values: readonly number[]; field: ResultField }) {
  if (values.length === 0) return <span className="text-ink-2">none</span>;
  return (
    <span className="figure-list">
      {values.map((value, i) => (
        // The same figure may come twice: its place in the row is its identity.
        <Fragment key={i}>
          <span>
            <ShownFigure value={value} field={field} />
            {i < values.length - 1 && " ·"}
          </span>{" "}
        </Fragment>
      ))}
    </span>
  );
}

/** The ideal figure and what became of it; of the row's units the one that says most, decibels where it has them. */
function Cost({ row, ideal }: { row: Figure[]; ideal: Analysis["results"] }) {
  const main = row[0]!;
  const before = ideal[main.key];
  if (typeof before !== "number" || typeof main.value !== "number" || main.field.words) return null;
  const change = changeText(before, main.value, main.field.unit);
  if (change === undefined) return <span className="result-cost dim">as ideal</span>;
  const inDecibels = row.find(({ field }) => field.unit === "dB");
  const decibelsBefore = inDecibels && ideal[inDecibels.key];
  const decibels =
    inDecibels && typeof decibelsBefore === "number" && typeof inDecibels.value === "number"
      ? changeText(decibelsBefore, inDecibels.value, "dB")
      : undefined;
  const printed = printShown(before, main.field);
  const sameUnit = printed.unit === printShown(main.value, main.field).unit;
  return (
    <span className="result-cost">
      <span className="sr-only">ideally </span>
      <span className="was">
        {printed.figure}
        {sameUnit || printed.unit === "" ? "" : ` ${printed.unit}`}
      </span>{" "}
      <span className="cost">{main.field.unit !== "dB" && decibels !== undefined ? decibels : change}</span>
    </span>
  );
}
