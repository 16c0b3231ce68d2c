import type { SpreadView } from "#lib/circuit/analysis/spread/index.ts";
import { typesOf } from "#lib/circuit/parts/partTypes.ts";
import type { AnyTopology } from "#lib/circuit/index.ts";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { SymbolText } from "../sheet/SymbolText.tsx";
import { withType } from "./settings.ts";
import type { Spread } from "./useSpread.ts";

/** Sort and tolerance of each part, and its share in the spread of the shown result. */
export function PartsSpread({
  topology,
  state,
  designators,
  spread,
  id,
}: StagePanelProps & { spread: Spread; id: string }) {
  const { settings, change, faults, view, request } = spread;
  const fitted = Object.entries(topology.parts).filter(([part]) => state.parts[part]! > 0);
  if (fitted.length === 0)
    return <p className="note">This network has no parts of its own: its spread is that of its devices.</p>;
  const shares = sharesOf(view, request?.tolerances ?? {});
  const largest = Math.max(0, ...Object.values(shares));
  const faulty = fitted.map(([part]) => [part, faults[`tolerance-${part}`]] as const).find(([, fault]) => fault);
  return (
    <section aria-labelledby={`${id}-parts`}>
      <h4 id={`${id}-parts`}>What moves {named(topology, settings.result)}</h4>
      <table className="table spread-parts">
        <thead>
          <tr>
            <th scope="col">Part</th>
            <th scope="col">Sort</th>
            <th scope="col" className="right">
              Tolerance, ± %
            </th>
            <th scope="col" className="right only-wide">
              Moves it
            </th>
            <th scope="col" className="right">
              Share of the spread
            </th>
          </tr>
        </thead>
        <tbody>
          {fitted.map(([part, field]) => (
            <tr key={part}>
              <th scope="row">
                <span className="val part-mark">{designators[part] ?? <SymbolText symbol={field.symbol} />}</span>{" "}
                <span className="text-ink-2 only-wide">{field.label}</span>
              </th>
              <td>
                <select
                  className="select-plain"
                  aria-label={`Sort of ${field.label}`}
                  value={settings.types[part]}
                  onChange={(event) => change(withType(settings, part, event.target.value))}
                >
                  {typesOf(field.partClass).map(({ id: type, label }) => (
                    <option key={type} value={type}>
                      {label}
                    </option>
                  ))}
                </select>
              </td>
              <td className="right">
                <input
                  className="input input-cell spread-tolerance"
                  type="text"
                  autoComplete="off"
                  aria-label={`Tolerance of ${field.label}, per cent`}
                  aria-invalid={faults[`tolerance-${part}`] !== undefined || undefined}
                  aria-describedby={`${id}-tolerances`}
                  value={settings.tolerances[part]}
                  onChange={(event) => change({ tolerances: { ...settings.tolerances, [part]: event.target.value } })}
                />
              </td>
              <td className="right text-ink-2 only-wide">
                {view?.sensitivities[part] === undefined ? "–" : slopeText(view.sensitivities[part])}
              </td>
              <td className="right">
                <ShareBar share={shares[part] ?? 0} most={largest > 0 && (shares[part] ?? 0) > 0.95 * largest} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <p id={`${id}-tolerances`} className={faulty ? "field-note error" : "field-note"}>
        {faulty
          ? `${topology.parts[faulty[0]]!.label}: ${faulty[1]}`
          : "An empty tolerance takes the part as exact. “Moves it”: per cent of the result for one per cent of the part."}
      </p>
    </section>
  );
}

const named = (topology: AnyTopology, result: string) => {
  const { label } = topology.results[result]!;
  return `the ${label.charAt(0).toLowerCase()}${label.slice(1)}`;
};

const slopeText = (slope: number) =>
  slope
    .toFixed(2)
    .replace(/^-0\.00$/, "0.00")
    .replace("-", "−");

function ShareBar({ share, most }: { share: number; most: boolean }) {
  return (
    <span className={most ? "share-bar share-bar-most" : "share-bar"}>
      <span className="share-track" aria-hidden="true">
        <span style={{ width: `${100 * share}%` }} />
      </span>
      <span className="num">{Math.round(100 * share)} %</span>
    </span>
  );
}

/** Of the variance to first order, each part by itself. */
function sharesOf(view: SpreadView | null, tolerances: Record<string, number>): Record<string, number> {
  const squares = Object.entries(view?.sensitivities ?? {}).map(([part, slope]): [string, number] => [
    part,
    (slope * (tolerances[part] ?? 0)) ** 2,
  ]);
  const sum = squares.reduce((total, [, square]) => total + square, 0);
  return sum > 0 ? Object.fromEntries(squares.map(([part, square]) => [part, square / sum])) : {};
}
