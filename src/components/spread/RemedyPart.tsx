import { useState } from "react";
import { remedyStatement, type Remedy } from "#lib/circuit/analysis/spread/index.ts";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { SymbolText } from "../sheet/SymbolText.tsx";
import { percent } from "./AskWindows.tsx";
import { withTolerances } from "./settings.ts";
import type { Spread } from "./useSpread.ts";

type RemedyProps = StagePanelProps & { spread: Spread; id: string };

/** What it would take: the cheapest tolerances for a wanted yield. */
export function RemedyPart(props: RemedyProps) {
  const { spread, id } = props;
  const [text, setText] = useState("99");
  const plain = text.replace(/%\s*$/, "").trim();
  const wanted = /^\d+(\.\d+)?$/.test(plain) ? Number(plain) / 100 : Number.NaN;
  const fault = wanted > 0 && wanted < 1 ? undefined : "Type a yield in per cent, above 0 and below 100.";
  const windows = Object.keys(spread.request?.window ?? {}).length;
  return (
    <section aria-labelledby={`${id}-remedy`} className="spread-remedy">
      <h4 id={`${id}-remedy`}>What would it take</h4>
      <form
        className="spread-remedy-ask"
        onSubmit={(event) => {
          event.preventDefault();
          if (fault === undefined) spread.findRemedy(wanted);
        }}
      >
        <label htmlFor={`${id}-wanted`}>for a yield of</label>
        <input
          id={`${id}-wanted`}
          className="input input-cell spread-tolerance"
          type="text"
          autoComplete="off"
          value={text}
          aria-invalid={fault !== undefined || undefined}
          aria-describedby={`${id}-wanted-note`}
          onChange={(event) => setText(event.target.value)}
        />
        <span>%</span>
        <button
          type="submit"
          className="btn"
          disabled={
            fault !== undefined || windows === 0 || spread.phase !== "ended" || spread.search.kind === "working"
          }
        >
          Find the cheapest tolerances
        </button>
      </form>
      <p id={`${id}-wanted-note`} className={fault === undefined ? "field-note" : "field-note error"}>
        {fault ?? (windows === 0 ? "Say first what a good board has." : "")}
      </p>
      <div aria-live="polite">
        {spread.search.kind === "working" && <p className="text-ink-2">Weighing tolerances…</p>}
        {spread.search.kind === "found" && <Answer {...props} remedy={spread.search.remedy} />}
      </div>
    </section>
  );
}

function Answer({ topology, designators, spread, remedy }: RemedyProps & { remedy: Remedy }) {
  const { changes, reached, wanted } = remedy;
  if (reached && changes.length === 0)
    return <p>Nothing: {percent(remedy.yield.value)} of the boards are good as they are.</p>;
  const worst = Object.entries(remedy.offCentre).sort(([, a], [, b]) => Math.abs(b) - Math.abs(a))[0];
  return (
    <>
      <p>
        {reached
          ? `With these, ${percent(remedy.yield.value)} of the boards are good:`
          : `No tolerance that is sold reaches ${percent(wanted)}: with everything at its tightest, ${percent(remedy.yield.value)} of the boards are good.`}
        {!reached &&
          worst !== undefined &&
          Math.abs(worst[1]) > 0.2 &&
          ` The nominal ${topology.results[worst[0]]!.label.toLowerCase()} lies ${Math.abs(100 * worst[1]).toFixed(0)} % of the way from the middle of its window to the ${worst[1] > 0 ? "most" : "least"} allowed: move it towards the middle first.`}
      </p>
      {reached && (
        <>
          <ul className="spread-changes">
            {changes.map(({ part, from, to }) => (
              <li key={part}>
                <span className="val">{designators[part] ?? <SymbolText symbol={topology.parts[part]!.symbol} />}</span>{" "}
                {topology.parts[part]!.label}: <span className="was">± {percentText(from)}</span> → ± {percentText(to)}
              </li>
            ))}
          </ul>
          <button
            type="button"
            className="btn btn-small"
            onClick={() =>
              spread.change(
                withTolerances(spread.settings, Object.fromEntries(changes.map(({ part, to }) => [part, to]))),
              )
            }
          >
            Take these tolerances
          </button>
        </>
      )}
      <p className="spread-note">{remedyStatement}</p>
    </>
  );
}

const percentText = (share: number) => `${Number((100 * share).toPrecision(4))} %`;
