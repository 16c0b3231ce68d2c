import { formatQuantity, type AnyTopology } from "#lib/circuit/index.ts";
import { StateMark } from "../page/StateMark.tsx";
import { Warnings } from "../sheet/Warnings.tsx";
import { percent } from "../spread/AskWindows.tsx";
import type { Trim } from "./useTrim.ts";

/** Less than this of the travel cannot be set by hand: common practice. */
const leastUseful = 0.4;

/** How much of the travel is of use, whether every board gets there, and what the ends do. */
export function TrimFiguresPart({ topology, trim }: { topology: AnyTopology; trim: Trim }) {
  const { figures, coverage, request } = trim;
  if (!figures || !request)
    return <p className="text-ink-2">{request ? "Turning the knob…" : "Say what the pot must reach."}</p>;
  const { unit } = topology.results[request.result]!;
  const covers = figures.worstCaseMargin >= 0;
  const { usefulRotation: useful, sensitivityPerDegree: sensitivity } = figures;
  const shown = (value: number) => formatQuantity(value, unit);
  return (
    <section aria-label="Travel and coverage">
      <p>
        <strong className="spread-share">{figures.usefulDegrees.toFixed(0)}°</strong> of{" "}
        {request.knob.electricalAngle.toFixed(0)}° are of use, {percent(useful)} of the travel{" "}
        <StateMark
          state={useful >= leastUseful ? "within" : useful > 0 ? "close" : "outside"}
          word={useful >= leastUseful ? "can be set by hand" : useful > 0 ? "little" : "out of reach"}
        />
      </p>
      <table className="table spread-methods">
        <caption className="sr-only">Travel and coverage</caption>
        <tbody>
          <tr>
            <th scope="row">Every board reaches</th>
            <td className="right">
              {figures.reach ? `${shown(figures.reach.least)} to ${shown(figures.reach.most)}` : "nothing in common"}
            </td>
            <td className="result-state">
              <StateMark state={covers ? "within" : "outside"} word={covers ? "covers it" : "misses it"} />
              <span className="result-error">margin {percentSigned(figures.worstCaseMargin)}</span>
            </td>
          </tr>
          <tr>
            <th scope="row">Random boards that reach all of it</th>
            <td className="right">{coverage ? percent(coverage.ofWindow.value) : "…"}</td>
            <td className="text-ink-2">
              {coverage && `of ${coverage.boards}; the middle of it, ${percent(coverage.ofTarget.value)}`}
            </td>
          </tr>
          <tr>
            <th scope="row">Middle of the window</th>
            <td className="right">
              {figures.centre === undefined
                ? "out of reach"
                : `${(figures.centre * request.knob.electricalAngle).toFixed(0)}°`}
            </td>
            <td className="text-ink-2">
              {sensitivity !== undefined && `${(100 * sensitivity).toPrecision(3)} % per degree`}
              {sensitivity !== undefined && sensitivity > 0.02 && ", too much to set by hand"}
            </td>
          </tr>
          {figures.ends.map(({ rotation, value, extreme }) => (
            <tr key={rotation}>
              <th scope="row">At {(rotation * request.knob.electricalAngle).toFixed(0)}°</th>
              <td className="right">{shown(value)}</td>
              <td className="text-ink-2">
                {shown(extreme.least)} to {shown(extreme.most)} on any board
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {figures.ends.map(({ rotation, warnings }) => {
        // Warnings that stand in the middle of the travel too are shown on the sheet already.
        const own = warnings.filter(({ severity }) => severity === "fault");
        return own.length > 0 && <Warnings key={rotation} warnings={own} />;
      })}
    </section>
  );
}

const percentSigned = (share: number) => `${share < 0 ? "−" : "+"}${(100 * Math.abs(share)).toPrecision(3)} %`;
