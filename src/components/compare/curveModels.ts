import type { Axis, Unit } from "#lib/circuit/index.ts";
import { axisOf, scaled, xRoom, yAxis, type PlotModel, type PlotRoom } from "../plot/plotModel.ts";

/** Two curves laid over one another, as they come over the wire. */
export interface CurvePairData {
  id: string;
  name: string;
  xAxis: Axis;
  yAxis: Axis;
  x: readonly number[];
  from: readonly number[];
  to: readonly number[];
  difference: readonly number[];
  differenceUnit: Unit;
  relative: boolean;
  window?: { x?: readonly [number, number]; y?: readonly [number, number] };
}

export interface SideLabels {
  from: string;
  to: string;
}

const times = (values: readonly number[], factor: number) => values.map((value) => value * factor);

/** The newer side stands first: it is drawn solid, over the dashed older one. */
export function overlayModel(pair: CurvePairData, labels: SideLabels, room: PlotRoom): PlotModel {
  const [xFactor, yFactor] = [pair.xAxis.shown?.factor ?? 1, pair.yAxis.shown?.factor ?? 1];
  const [from, to] = [times(pair.from, yFactor), times(pair.to, yFactor)];
  const xs = times(pair.x, xFactor);
  const window = pair.window && {
    ...(pair.window.x && { x: scaled(pair.window.x, xFactor) }),
    ...(pair.window.y && { y: scaled(pair.window.y, yFactor) }),
  };
  return {
    id: pair.id,
    name: pair.name,
    x: axisOf(pair.xAxis, [xs[0]!, xs.at(-1)!], xRoom(room), true),
    y: yAxis(pair.yAxis, [from, to], window?.y, Math.max(3, Math.floor(room.height / 52))),
    xs,
    lines: [
      { id: "to", label: labels.to, ys: to },
      { id: "from", label: labels.from, ys: from },
    ],
    ...(window && { window }),
  };
}

/** The difference on an axis of its own, zero always in sight. */
export function differenceModel(pair: CurvePairData, labels: SideLabels, room: PlotRoom): PlotModel {
  const xFactor = pair.xAxis.shown?.factor ?? 1;
  const factor = pair.relative ? 100 : pair.differenceUnit === "" ? 1 : (pair.yAxis.shown?.factor ?? 1);
  const ys = times(pair.difference, factor);
  const xs = times(pair.x, xFactor);
  const unit = pair.relative ? "%" : pair.differenceUnit;
  const axis: Axis = { quantity: "Difference", unit, scale: "linear" };
  return {
    id: `${pair.id}-difference`,
    name: `${pair.name}, difference`,
    x: axisOf(pair.xAxis, [xs[0]!, xs.at(-1)!], xRoom(room), true),
    y: yAxis(axis, [ys, [0]], undefined, 4),
    xs,
    lines: [{ id: "difference", label: `${labels.to} less ${labels.from}`, ys }],
  };
}
