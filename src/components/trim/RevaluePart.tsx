import { formatPartValue } from "#lib/circuit/index.ts";
import type { Revalued } from "#lib/circuit/analysis/trim/index.ts";
import { revalueStatement } from "#lib/circuit/analysis/trim/index.ts";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { SymbolText } from "../sheet/SymbolText.tsx";
import { percent } from "../spread/AskWindows.tsx";
import type { Trim } from "./useTrim.ts";

type RevalueProps = StagePanelProps & { trim: Trim; id: string };

/** Padding and a pot that exist and make more of the travel. */
export function RevaluePart(props: RevalueProps) {
  const { trim, id } = props;
  const { settings, change, faults, revaluation } = trim;
  return (
    <section aria-labelledby={`${id}-revalue`}>
      <h4 id={`${id}-revalue`}>Re-value</h4>
      <form
        className="spread-remedy-ask"
        onSubmit={(event) => {
          event.preventDefault();
          trim.revalue();
        }}
      >
        <label htmlFor={`${id}-useful`}>so that at least</label>
        <input
          id={`${id}-useful`}
          className="input input-cell spread-tolerance"
          type="text"
          autoComplete="off"
          value={settings.useful}
          aria-invalid={faults["useful"] !== undefined || undefined}
          aria-describedby={`${id}-useful-note`}
          onChange={(event) => change({ useful: event.target.value })}
        />
        <span>% of the travel are of use</span>
        <button type="submit" className="btn" disabled={!trim.request || trim.pending || revaluation === "working"}>
          Find values
        </button>
      </form>
      <p id={`${id}-useful-note`} className={faults["useful"] === undefined ? "field-note" : "field-note error"}>
        {faults["useful"]}
      </p>
      <div aria-live="polite">
        {revaluation === "working" && <p className="text-ink-2">Trying pots and padding…</p>}
        {revaluation !== null && revaluation !== "working" && (
          <>
            <p>{revaluation.says}</p>
            {revaluation.choices.length > 0 && <Choices {...props} choices={revaluation.choices} />}
            <p className="spread-note">
              {revalueStatement} {revaluation.tried.toLocaleString("en-GB")} combinations tried.
            </p>
          </>
        )}
      </div>
    </section>
  );
}

function Choices({ topology, state, designators, readOnly, apply, choices }: RevalueProps & { choices: Revalued[] }) {
  const moved = Object.keys(topology.parts).filter((part) => choices.some(({ parts }) => part in parts));
  return (
    <table className="table">
      <thead>
        <tr>
          {moved.map((part) => (
            <th key={part} scope="col" className="right">
              {designators[part] ?? <SymbolText symbol={topology.parts[part]!.symbol} />}
            </th>
          ))}
          <th scope="col" className="right">
            Of use
          </th>
          <th scope="col" className="right">
            Margin
          </th>
          <th scope="col">
            <span className="sr-only">Take them</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {choices.map(({ parts, usefulRotation, worstCaseMargin }) => {
          const texts = moved.map((part) =>
            formatPartValue(parts[part] ?? state.parts[part]!, topology.parts[part]!.unit),
          );
          return (
            <tr key={texts.join()}>
              {texts.map((text, i) => (
                <td key={moved[i]} className="right val">
                  {text}
                </td>
              ))}
              <td className="right">{percent(usefulRotation)}</td>
              <td className="right">+{(100 * worstCaseMargin).toPrecision(2)} %</td>
              <td>
                {!readOnly && (
                  <button
                    type="button"
                    className="btn btn-small"
                    aria-label={`Take ${texts.join(" and ")}`}
                    onClick={() => apply(parts)}
                  >
                    Take
                  </button>
                )}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
