import {
  formatPartValue,
  meritStatement,
  printQuantity,
  type Candidate,
  type PlainValues,
  type Solution,
} from "#lib/circuit/index.ts";
import { errorText } from "#lib/wire/changeText.ts";
import { SymbolText } from "./SymbolText.tsx";
import { useCandidates } from "./useCandidates.ts";
import { TextWithSymbols } from "./TextWithSymbols.tsx";
import type { Stage } from "./useStage.ts";

interface CandidatesProps {
  stage: Stage;
  id: string;
  keep: boolean;
  onKeep: (keep: boolean) => void;
  onClose: () => void;
  designators: Record<string, string>;
}

/** Combinations of values that exist, best first: what each really gives, and how far that is from the targets. */
export function Candidates({ stage, id, keep, onKeep, onClose, designators }: CandidatesProps) {
  const search = useCandidates(stage, true, keep);
  const outcome = search.kind === "done" ? search.outcome : search.kind === "working" ? search.before : null;
  const solution = outcome && "candidates" in outcome ? outcome : null;
  const refusal = outcome && "refused" in outcome ? outcome : null;
  const { topology } = stage;
  const anchors = topology.anchors.map(({ part }) => part);
  return (
    <section className="stage-candidates" aria-labelledby={`${id}-head`}>
      <div className="candidates-head">
        <h3 id={`${id}-head`}>Values that exist</h3>
        <p className="text-small text-ink-2" role="status">
          {search.kind === "working" && "Working out parts…"}
          {search.kind === "failed" &&
            "This browser could not run the search. Step the values by hand, or load the page again."}
          {search.kind === "done" && solution && `${solution.tried.toLocaleString("en-GB")} combinations tried`}
          {search.kind === "done" && refusal && "Nothing to choose from"}
        </p>
        {anchors.length > 0 && (
          <label className="choice" htmlFor={`${id}-keep`}>
            <input
              id={`${id}-keep`}
              type="checkbox"
              checked={keep}
              onChange={(event) => onKeep(event.target.checked)}
            />
            <span>
              Keep{" "}
              {anchors.map((part, i) => (
                <span key={part}>
                  {i > 0 && ", "}
                  <SymbolText symbol={topology.parts[part]!.symbol} />{" "}
                  <span className="val">{formatPartValue(stage.state.parts[part]!, topology.parts[part]!.unit)}</span>
                </span>
              ))}
            </span>
          </label>
        )}
        <button type="button" className="btn-text" onClick={onClose}>
          Close
        </button>
      </div>
      {refusal && (
        <div className="fault">
          <strong>No parts give this.</strong> <TextWithSymbols text={refusal.message} />
        </div>
      )}
      {solution && solution.candidates.length === 0 && (
        <p className="note">
          None of the combinations tried gives every target a figure. Take another series, or move a target.
        </p>
      )}
      {solution && solution.candidates.length > 0 && (
        <CandidateTable stage={stage} solution={solution} stale={search.kind !== "done"} designators={designators} />
      )}
      {solution && <p className="text-small text-ink-2 mt-2">{meritStatement}</p>}
    </section>
  );
}

interface CandidateTableProps {
  stage: Stage;
  solution: Solution;
  stale: boolean;
  designators: Record<string, string>;
}

function CandidateTable({ stage, solution, stale, designators }: CandidateTableProps) {
  const { topology } = stage;
  const parts = Object.entries(topology.parts).filter(([key]) => solution.candidates.some((c) => c.parts[key]! > 0));
  const targets = Object.entries(topology.targets);
  return (
    <div className="table-scroll" aria-busy={stale}>
      <table className="table candidate-table">
        <thead>
          <tr>
            <th scope="col" className="right">
              <span className="sr-only">Rank</span>
            </th>
            <th scope="col">
              <span className="sr-only">Take</span>
            </th>
            {parts.map(([key, field]) => (
              <th key={key} scope="col" className="right">
                {designators[key] ?? <SymbolText symbol={field.symbol} />}
              </th>
            ))}
            {targets.map(([key, field]) => (
              <th key={key} scope="col" className="right">
                {field.label}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {solution.candidates.map((candidate, i) => (
            <tr key={JSON.stringify(candidate.parts)}>
              <td className="right dim">{i + 1}</td>
              <td>
                <TakeButton stage={stage} candidate={candidate} rank={i + 1} />
              </td>
              {parts.map(([key, field]) => (
                <td key={key} className="right val">
                  {formatPartValue(candidate.parts[key]!, field.unit)}
                </td>
              ))}
              {targets.map(([key]) => (
                <GivenFigure key={key} stage={stage} candidate={candidate} target={key} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Stays the same button when its candidate is taken, so that the keyboard keeps its place. */
function TakeButton({ stage, candidate, rank }: { stage: Stage; candidate: Candidate; rank: number }) {
  const taken = sameParts(candidate.parts, stage.state.parts);
  return (
    <button
      type="button"
      className="btn btn-small"
      aria-label={taken ? `Number ${rank} is in use` : `Take number ${rank}`}
      aria-disabled={taken}
      onClick={() => taken || stage.actions.applyParts(candidate.parts)}
    >
      {taken ? "In use" : "Take"}
    </button>
  );
}

function GivenFigure({ stage, candidate, target }: { stage: Stage; candidate: Candidate; target: string }) {
  const field = stage.topology.targets[target]!;
  const value = candidate.results[field.result];
  if (typeof value !== "number") return <td className="right">–</td>;
  const { figure, unit } = printQuantity(value, stage.topology.results[field.result]!.unit);
  const error = candidate.errors[target]!;
  const width = stage.state.windows[target] ?? field.window;
  return (
    <td className="right">
      {figure} <span className="dim">{unit}</span>{" "}
      <span className={Math.abs(error) <= width ? "candidate-error" : "candidate-error text-outside"}>
        {errorText(error)}
        {Math.abs(error) > width && <span className="sr-only">, outside the window</span>}
      </span>
    </td>
  );
}

function sameParts(a: PlainValues, b: PlainValues): boolean {
  return Object.keys(a).every((key) => Math.abs(a[key]! - b[key]!) <= 1e-9 * Math.abs(a[key]!));
}
