import { formatQuantity, type AnyTopology, type Unit } from "#lib/circuit/index.ts";
import { worstCaseStatements, type SpreadView, type Yield } from "#lib/circuit/analysis/spread/index.ts";
import { percent, shareDigits } from "./AskWindows.tsx";
import type { Spread } from "./useSpread.ts";

/** The share of good boards with its bounds, how far the drawing has come, and the shown result by all three methods. */
export function SpreadFigures({ topology, spread }: { topology: AnyTopology; spread: Spread }) {
  const { view, phase, settings, request } = spread;
  const { label, unit } = topology.results[settings.result]!;
  return (
    <section className="spread-figures" aria-label="Yield and spread">
      <div className="spread-yield">
        {view?.yield ? (
          <p>
            <strong className="spread-share">{percent(view.yield.value)}</strong> of the boards are good
            <span className="spread-bounds">{boundsText(view.yield)} (95 % sure, exact binomial bounds).</span>
          </p>
        ) : (
          <p className="text-ink-2">
            {view ? "Say above what a good board is, and the yield stands here." : "Drawing the first boards…"}
          </p>
        )}
        <Progress spread={spread} />
      </div>
      {phase === "failed" && (
        <p className="fault" role="alert">
          <strong>The boards could not be drawn.</strong> This browser could not run the calculation. Nothing on the
          sheet is lost; load the page again.
        </p>
      )}
      {!request && (
        <p className="note">
          One of the fields cannot be read; the figures are still those from before it was changed. Its note says what
          to do.
        </p>
      )}
      {view && <Methods view={view} result={settings.result} label={label} unit={unit} />}
    </section>
  );
}

function boundsText({ low, high }: Yield): string {
  const digits = Math.max(shareDigits(low), shareDigits(high));
  return `The yield lies between ${percent(low, digits)} and ${percent(high, digits)}`;
}

function Progress({ spread: { view, phase, stop } }: { spread: Spread }) {
  const count = (boards: number) => boards.toLocaleString("en-GB");
  return (
    <div className="spread-progress">
      <progress max={view?.of ?? 1} value={view?.done ?? 0} aria-label="Boards drawn" />
      <span className="num">
        {view ? `${count(view.done)} of ${count(view.of)} boards` : "0 boards"}
        {phase === "ended" && view && view.done < view.of && ", stopped"}
      </span>
      <button type="button" className="btn-text" disabled={phase !== "drawing"} onClick={stop}>
        Stop
      </button>
      <span role="status" className="sr-only">
        {phase === "ended" && view?.yield ? `${percent(view.yield.value)} of the boards are good.` : ""}
      </span>
    </div>
  );
}

interface MethodsProps {
  view: SpreadView;
  result: string;
  label: string;
  unit: Unit;
}

function Methods({ view, result, label, unit }: MethodsProps) {
  const nominal = view.nominal[result];
  const spread = view.result;
  const corner = view.worstCase?.results[result];
  const deviation = view.rootSumSquare;
  if (nominal === undefined)
    return <p className="note">The nominal board gives no {label.toLowerCase()}. Look at another result.</p>;
  const row = (name: string, low: number | undefined, middle: number | undefined, high: number | undefined) => (
    <tr>
      <th scope="row">{name}</th>
      {[low, middle, high].map((value, i) => (
        <td key={i} className="right">
          {value === undefined ? (
            <span className="dim">…</span>
          ) : (
            <>
              {formatQuantity(value, unit)}
              {value !== nominal && nominal !== 0 && unit !== "dB" && (
                <span className="spread-off">{signed(value / nominal - 1)}</span>
              )}
            </>
          )}
        </td>
      ))}
    </tr>
  );
  const turning = view.worstCase?.turning.includes(result) === true;
  return (
    <>
      <table className="table spread-methods">
        <caption className="sr-only">{label} by three methods</caption>
        <thead>
          <tr>
            <th scope="col">{label}</th>
            <th scope="col" className="right">
              Low
            </th>
            <th scope="col" className="right only-wide">
              Middle
            </th>
            <th scope="col" className="right">
              High
            </th>
          </tr>
        </thead>
        <tbody>
          {row("Worst case, corners", corner?.least, nominal, corner?.most)}
          {row(
            "First order, ± 2 deviations",
            deviation === undefined ? undefined : nominal - 2 * deviation,
            nominal,
            deviation === undefined ? undefined : nominal + 2 * deviation,
          )}
          {row(
            "Random boards, 5 to 95 %",
            spread?.quantiles["0.05"],
            spread?.quantiles["0.5"],
            spread?.quantiles["0.95"],
          )}
        </tbody>
      </table>
      <p className="spread-note">
        Standard deviation: {formatDeviation(spread?.standardDeviation, nominal, unit)} over the boards,{" "}
        {formatDeviation(deviation, nominal, unit)} to first order (root of the sum of squares).{" "}
        {view.worstCase && worstCaseStatements[view.worstCase.method]}
        {turning && " This result turns back inside the tolerances of a part: its extreme may lie beyond the corners."}
        {(spread?.missing ?? 0) > 0 && ` ${spread!.missing} boards give no figure.`}
      </p>
    </>
  );
}

const signed = (share: number) => `${share < 0 ? "−" : "+"}${(100 * Math.abs(share)).toPrecision(3)} %`;

function formatDeviation(deviation: number | undefined, nominal: number, unit: Unit): string {
  if (deviation === undefined) return "…";
  const share = nominal === 0 || unit === "dB" ? "" : ` (${((100 * deviation) / Math.abs(nominal)).toPrecision(3)} %)`;
  return `${formatQuantity(deviation, unit, 3)}${share}`;
}
