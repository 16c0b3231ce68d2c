import { completeConditions, type PlainConditions, type PlainValues } from "./defaults.ts";
import { spacedValues, type Axis } from "./curve.ts";
import type { AnyTopology } from "./topology.ts";

export interface PlottedLine {
  /** Id of the curve, the same for each of its lines. */
  id: string;
  /** "now", or the companion's id. */
  line: string;
  label: string;
  x: { quantity: string; unit: string };
  y: { quantity: string; unit: string };
  points: [number, number][];
}

export interface PlotRequest {
  parts: PlainValues;
  conditions?: PlainConditions;
  /** Only these curves. */
  curves?: readonly string[];
  /** The x values wanted; those outside a curve's meaning are skipped. Left out: 241 over the stretch worth drawing. */
  at?: readonly number[];
}

const usualCount = 241;

/** Every line of every asked curve, as points in plain units. Points without a finite y are left out. */
export function plotStage(topology: AnyTopology, request: PlotRequest): PlottedLine[] {
  const state = { parts: request.parts, conditions: completeConditions(topology, request.conditions) as never };
  const wanted = topology.curves.filter((curve) => request.curves?.includes(curve.id) ?? true);
  return wanted.flatMap((curve) => {
    const [least, most] = curve.defined ?? [-Infinity, Infinity];
    const xs =
      request.at?.filter((x) => x >= least && x <= most) ?? spacedValues(curve.x, curve.domain(state), usualCount);
    return curve.lines(state).map((line) => ({
      id: curve.id,
      line: line.id,
      label: line.label,
      x: named(curve.x),
      y: named(curve.y),
      points: xs.map((x): [number, number] => [x, line.at(x)]).filter(([, y]) => Number.isFinite(y)),
    }));
  });
}

const named = ({ quantity, unit }: Axis) => ({ quantity, unit });
