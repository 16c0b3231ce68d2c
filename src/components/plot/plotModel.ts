import {
  formatQuantity,
  formatTyped,
  printQuantity,
  spacedValues,
  targetWindows,
  units,
  type AnyTopology,
  type Axis,
  type Unit,
} from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { sampled } from "./sampling.ts";
import { linearTicks, logarithmicTicks } from "./ticks.ts";

export type PlotCurve = AnyTopology["curves"][number];

export interface PlotAxis {
  /** Beside the axis, with the prefix of its ticks: "Time, ms". */
  title: string;
  /** Above figures in the plain unit: "Time, s". */
  plainTitle: string;
  unit: Unit;
  scale: "linear" | "logarithmic";
  domain: [number, number];
  ticks: number[];
  /** The power of ten that the title's prefix stands for: ticks of milliseconds read 1, 2, 3. */
  exponent?: number;
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

/** Points to begin with; a bent curve gets more where it bends. */
const count = 101;
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
  const yFactor = curve.y.shown?.factor ?? 1;
  const drawnLines = curve.lines(state);
  const points = sampled(
    withMark(spacedValues(curve.x, stretch, count), curve.mark?.(state)?.x),
    drawnLines.map(({ at }) => at),
    {
      logarithmic: curve.y.scale === "logarithmic",
      reach: shownUnit(curve.y) === "dB" ? mostDecibels / yFactor : Infinity,
    },
  );
  const ys = points.ys.map((line) => line.map((y) => finite(y * yFactor)));
  const lines = drawnLines.map(({ id, label }, i): PlotLine => ({
    id,
    label,
    ys: ys[i]!,
  }));
  if (ys.every((line) => line.every((y) => y === null))) return undefined;
  const wanted = curve.window?.(targetWindows(topology, stage.targets, stage.windows));
  const window = wanted && {
    ...(wanted.x && { x: scaled(wanted.x, factor) }),
    ...(wanted.y && { y: scaled(wanted.y, yFactor) }),
  };
  return {
    id: curve.id,
    name: curve.name,
    x: axisOf(curve.x, scaled(stretch, factor), xRoom(room), true),
    y: yAxis(curve.y, ys, window?.y, yRoom(room)),
    xs: points.xs.map((x) => x * factor),
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

const shownUnit = (axis: Axis): Unit => axis.shown?.unit ?? axis.unit;

export function axisOf(axis: Axis, domain: [number, number], room: number, exact: boolean): PlotAxis {
  const unit = shownUnit(axis);
  const titled = (shown: string) => (shown === "" ? axis.quantity : `${axis.quantity}, ${shown}`);
  const plainTitle = titled(unit);
  if (axis.scale === "logarithmic") {
    const ticks = logarithmicTicks(domain[0], domain[1], room);
    return { title: plainTitle, plainTitle, unit, scale: axis.scale, domain, ticks };
  }
  const linear = linearTicks(domain[0], domain[1], room, { angle: unit === "°", exact });
  // One prefix for the whole axis, said in its title: a logarithmic one runs through several.
  const exponent = units[unit].prefixed ? exponentOf(linear.domain) : undefined;
  const title = exponent === undefined ? plainTitle : titled(prefixed(unit, exponent));
  return { title, plainTitle, unit, scale: axis.scale, ...linear, ...(exponent !== undefined && { exponent }) };
}

function exponentOf([from, to]: readonly [number, number]): number {
  const largest = Math.max(Math.abs(from), Math.abs(to));
  if (!(largest > 0)) return 0;
  return Math.min(9, Math.max(-15, Math.floor((Math.log10(largest) + 1e-9) / 3) * 3));
}

/** "ms": as a whole thousandth, thousand and so on is printed with its unit. */
const prefixed = (unit: Unit, exponent: number) => printQuantity(10 ** exponent, unit).unit;

export function yAxis(
  axis: Axis,
  lines: readonly (readonly (number | null)[])[],
  window: readonly [number, number] | undefined,
  room: number,
): PlotAxis {
  const values = lines.flatMap((ys) => ys.filter((y) => y !== null));
  let least = Infinity;
  let most = -Infinity;
  for (const value of [...values, ...(window ?? [])]) {
    if (!Number.isFinite(value)) continue;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  if (shownUnit(axis) === "dB") least = Math.max(least, most - mostDecibels);
  if (axis.scale === "logarithmic") least = Math.max(least, most * 1e-9);
  const drawn = axisOf(axis, [least, most], room, false);
  const [foot, top] = drawn.domain;
  // A line that runs along the frame would not be seen; along the foot at nothing at all it is where it should be.
  if (axis.scale === "logarithmic") {
    const below = runsAlong(lines, (y) => Math.abs(Math.log(y / foot)) < 0.03) ? foot / 2 : foot;
    const above = runsAlong(lines, (y) => Math.abs(Math.log(y / top)) < 0.03) ? top * 2 : top;
    return axisOf(axis, [below, above], room, false);
  }
  const step = drawn.ticks[1]! - drawn.ticks[0]!;
  const below = foot !== 0 && runsAlong(lines, (y) => Math.abs(y - foot) < step / 50) ? foot - step : foot;
  const above = (top !== 0 || foot < 0) && runsAlong(lines, (y) => Math.abs(y - top) < step / 50) ? top + step : top;
  return below === foot && above === top ? drawn : axisOf(axis, [below, above], room + 1, false);
}

/** Whether a good part of a line lies there. */
function runsAlong(lines: readonly (readonly (number | null)[])[], there: (y: number) => boolean): boolean {
  return lines.some((ys) => ys.filter((y) => y !== null && there(y)).length > ys.length / 4);
}

/** A figure on an axis: 2k, −10, 90°. */
export function tickText(value: number, { unit, exponent }: Pick<PlotAxis, "unit" | "exponent">): string {
  const text =
    exponent === undefined ? formatTyped(value, unit, 4) : String(Number((value / 10 ** exponent).toPrecision(4)));
  // Beside an axis there is no room for 0.00001.
  const short = unit === "" && value !== 0 && Math.abs(value) < 1e-3 ? printQuantity(value, unit, 1).figure : text;
  const signed = short.replace(/^1 × /, "").replace("-", "\u2212");
  return unit === "°" ? `${signed}°` : signed;
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
