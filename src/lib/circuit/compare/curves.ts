import { completeConditions } from "../stage/defaults.ts";
import { spacedValues, type Axis } from "../stage/curve.ts";
import type { AnyTopology } from "../stage/topology.ts";
import type { DocumentStage } from "../voice/document.ts";
import type { Unit } from "../quantity/units.ts";
import { isSameFigure } from "./values.ts";

export interface CurvePair {
  stage: string;
  id: string;
  name: string;
  xAxis: Axis;
  yAxis: Axis;
  /** Only where both have a value; all three of the same length. */
  x: number[];
  from: number[];
  to: number[];
  /** New less old: in decibels where the curve is, else relative to the old, or in the curve's own unit where it crosses zero. */
  difference: number[];
  differenceUnit: Unit;
  /** Whether the difference is relative: 0.05 is 5 %. */
  relative: boolean;
}

interface Side {
  stage: DocumentStage;
  topology: AnyTopology;
}

const usualCount = 161;

const stateOf = ({ stage, topology }: Side) => ({
  parts: stage.parts,
  conditions: completeConditions(topology, stage.conditions) as never,
});

/** Each curve that both networks can draw, laid over one another on one stretch of x. */
export function overlaidCurves(from: Side, to: Side, count = usualCount): CurvePair[] {
  return to.topology.curves.flatMap((curve): CurvePair[] => {
    const before = from.topology.curves.find(({ id }) => id === curve.id);
    if (!before || before.y.unit !== curve.y.unit || before.x.unit !== curve.x.unit) return [];
    const [old, now] = [before.domain(stateOf(from)), curve.domain(stateOf(to))];
    const stretch = [Math.min(old[0], now[0]), Math.max(old[1], now[1])] as const;
    if (!stretch.every(Number.isFinite) || stretch[0] >= stretch[1]) return [];
    const [oldLine, newLine] = [before.lines(stateOf(from))[0], curve.lines(stateOf(to))[0]];
    if (!oldLine || !newLine) return [];
    const points = xValues(curve.x, stretch, count, [
      before.mark?.(stateOf(from))?.x,
      curve.mark?.(stateOf(to))?.x,
    ]).flatMap((x) => {
      const [a, b] = [oldLine.at(x), newLine.at(x)];
      return Number.isFinite(a) && Number.isFinite(b) ? [[x, a, b] as const] : [];
    });
    if (points.length < 2 || turnsNothing(curve.x, points)) return [];
    const [xs, olds, news] = [0, 1, 2].map((column) => points.map((point) => point[column]!)) as [
      number[],
      number[],
      number[],
    ];
    return [
      {
        ...{ stage: to.stage.id, id: curve.id, name: curve.name, xAxis: curve.x, yAxis: curve.y },
        ...{ x: xs, from: olds, to: news },
        ...differenceOf(curve.y.unit, olds, news),
      },
    ];
  });
}

/** A curve over the rotation of a pot that neither side fits. */
function turnsNothing({ shown }: Axis, points: readonly (readonly [number, number, number])[]): boolean {
  if (shown?.unit !== "°") return false;
  const [, a, b] = points[0]!;
  return points.every(([, from, to]) => isSameFigure(from, a) && isSameFigure(to, b));
}

/** The operating points are among them: a sharp peak would fall between two. */
function xValues(
  axis: Axis,
  stretch: readonly [number, number],
  count: number,
  marks: (number | undefined)[],
): number[] {
  const inside = marks.filter((x): x is number => x !== undefined && x > stretch[0] && x < stretch[1]);
  return [...new Set([...spacedValues(axis, stretch, count), ...inside])].sort((a, b) => a - b);
}

function differenceOf(
  unit: Unit,
  from: readonly number[],
  to: readonly number[],
): Pick<CurvePair, "difference" | "differenceUnit" | "relative"> {
  const relative = unit !== "dB" && from.every((value) => value > 0);
  if (relative) return { difference: to.map((value, i) => value / from[i]! - 1), differenceUnit: "", relative };
  return { difference: to.map((value, i) => value - from[i]!), differenceUnit: unit, relative };
}

/** Whether anything is to be seen in the difference at all. */
export function differs({ difference, from, relative }: CurvePair): boolean {
  if (relative) return difference.some((share) => Math.abs(share) > 1e-9);
  const size = from.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
  return difference.some((value) => Math.abs(value) > 1e-9 * Math.max(size, 1e-12));
}
