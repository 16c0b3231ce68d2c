import {
  formatQuantity,
  formatTyped,
  spacedValues,
  targetWindows,
  type AnyTopology,
  type Axis,
  type Unit,
} from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { linearTicks, logarithmicTicks } from "./ticks.ts";

export type PlotCurve = AnyTopology["curves"][number];

export interface PlotAxis {
  title: string;
  unit: Unit;
  scale: "linear" | "logarithmic";
  domain: [number, number];
  ticks: number[];
}

export interface PlotLine {
  id: string;
  label: string;
  /** At each x of the plot; null where the curve has no value. */
  ys: (number | null)[];
  /** Left out, a line. Bars stand on zero and fill the step between one x and the next; an edge bounds an area. */
  drawn?: "dots" | "bars" | "edge";
}

/** A curve as it is drawn: figures in the units that people read (degrees of rotation, not shares). */
export interface PlotModel {
  id: string;
  name: string;
  x: PlotAxis;
  y: PlotAxis;
  xs: number[];
  lines: PlotLine[];
  /** Ids of two lines with the stretch between them filled. */
  area?: readonly [string, string];
  window?: { x?: readonly [number, number]; y?: readonly [number, number] };
  mark?: { x: number; y: number; label: string };
}

export interface PlotRoom {
  width: number;
  height: number;
}

const count = 201;
/** How far below its top a plot in decibels still says anything. */
const mostDecibels = 60;

/** @returns undefined where no line has a value to draw */
export function plotModel(
  topology: AnyTopology,
  curve: PlotCurve,
  stage: StageState,
  room: PlotRoom,
): PlotModel | undefined {
  const state = { parts: stage.parts, conditions: stage.conditions as never };
  const stretch = curve.domain(state);
  if (!stretch.every(Number.isFinite) || stretch[0] >= stretch[1]) return undefined;
  const factor = curve.x.shown?.factor ?? 1;
  const plainXs = withMark(spacedValues(curve.x, stretch, count), curve.mark?.(state)?.x);
  const yFactor = curve.y.shown?.factor ?? 1;
  const lines = curve.lines(state).map(({ id, label, at }): PlotLine => ({
    id,
    label,
    ys: plainXs.map((x) => finite(at(x) * yFactor)),
  }));
  const values = lines.flatMap(({ ys }) => ys.filter((y) => y !== null));
  if (values.length === 0) return undefined;
  const wanted = curve.window?.(targetWindows(topology, stage.targets, stage.windows));
  const window = wanted && {
    ...(wanted.x && { x: scaled(wanted.x, factor) }),
    ...(wanted.y && { y: scaled(wanted.y, yFactor) }),
  };
  return {
    id: curve.id,
    name: curve.name,
    x: axisOf(curve.x, scaled(stretch, factor), xRoom(room), true),
    y: yAxis(curve.y, values, window?.y, yRoom(room)),
    xs: plainXs.map((x) => x * factor),
    lines,
    ...(window && { window }),
    ...markOf(curve, state as never, factor, yFactor),
  };
}

/** The operating point is drawn exactly: a sharp peak would fall between two points. */
function withMark(xs: number[], mark: number | undefined): number[] {
  const [first, last] = [xs[0]!, xs.at(-1)!];
  if (mark === undefined || !(mark > first && mark < last) || xs.includes(mark)) return xs;
  return [...xs, mark].sort((a, b) => a - b);
}

const finite = (value: number) => (Number.isFinite(value) ? value : null);
export const scaled = ([a, b]: readonly [number, number], factor: number): [number, number] => [a * factor, b * factor];
export const xRoom = ({ width }: PlotRoom) => Math.max(3, Math.floor(width / 62));
export const yRoom = ({ height }: PlotRoom) => Math.max(3, Math.floor(height / 52));

function markOf(curve: PlotCurve, state: never, factor: number, yFactor: number): Pick<PlotModel, "mark"> {
  const mark = curve.mark?.(state);
  if (!mark || !Number.isFinite(mark.x)) return {};
  const y = curve.lines(state)[0]?.at(mark.x);
  if (y === undefined || !Number.isFinite(y)) return {};
  return { mark: { x: mark.x * factor, y: y * yFactor, label: mark.label } };
}

export function axisOf(axis: Axis, domain: [number, number], room: number, exact: boolean): PlotAxis {
  const unit = axis.shown?.unit ?? axis.unit;
  const title = unit === "" ? axis.quantity : `${axis.quantity}, ${unit}`;
  if (axis.scale === "logarithmic") {
    return { title, unit, scale: axis.scale, domain, ticks: logarithmicTicks(domain[0], domain[1], room) };
  }
  return { title, unit, scale: axis.scale, ...linearTicks(domain[0], domain[1], room, { angle: unit === "°", exact }) };
}

export function yAxis(
  axis: Axis,
  values: number[],
  window: readonly [number, number] | undefined,
  room: number,
): PlotAxis {
  let least = Infinity;
  let most = -Infinity;
  for (const value of [...values, ...(window ?? [])]) {
    if (!Number.isFinite(value)) continue;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  if ((axis.shown?.unit ?? axis.unit) === "dB") least = Math.max(least, most - mostDecibels);
  if (axis.scale === "logarithmic") least = Math.max(least, most * 1e-9);
  return axisOf(axis, [least, most], room, false);
}

/** A figure on an axis: 2k, −10, 90°. */
export function tickText(value: number, unit: Unit): string {
  const text = formatTyped(value, unit, 4).replace("-", "\u2212");
  return unit === "°" ? `${text}°` : text;
}

/** A figure of the readout, with its unit. */
export const readoutText = (value: number, unit: Unit) => formatQuantity(value, unit);

export interface Margins {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** The same for every rendering, so that the drawn plot and the interactive one lie on top of each other. */
export const margins: Margins = { left: 50, right: 16, top: 26, bottom: 42 };

/** Pixel positions of a model's figures in a room. */
export function placing(model: PlotModel, room: PlotRoom) {
  const share = (axis: PlotAxis, value: number) => {
    const [a, b] = axis.domain;
    return axis.scale === "logarithmic" ? Math.log(value / a) / Math.log(b / a) : (value - a) / (b - a);
  };
  const width = room.width - margins.left - margins.right;
  const height = room.height - margins.top - margins.bottom;
  return {
    x: (value: number) => tenth(margins.left + width * share(model.x, value)),
    y: (value: number) => tenth(margins.top + height * (1 - share(model.y, value))),
    width,
    height,
  };
}

/** Logarithms differ in their last digit between server and browser; what is drawn must not. */
const tenth = (pixels: number) => Math.round(pixels * 10) / 10;
