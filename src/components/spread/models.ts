import type { SpreadView } from "#lib/circuit/analysis/spread/index.ts";
import type { AnyTopology, Axis, Unit } from "#lib/circuit/index.ts";
import type { ResultWindows } from "#lib/circuit/analysis/spread/index.ts";
import { axisOf, xRoom, yRoom, type PlotCurve, type PlotModel, type PlotRoom } from "../plot/plotModel.ts";

const boardsAxis: Axis = { quantity: "Boards", unit: "", scale: "linear" };

/** The boards over a result, its window shaded. */
export function histogramModel(
  topology: AnyTopology,
  view: SpreadView,
  result: string,
  windows: ResultWindows,
  room: PlotRoom,
): PlotModel | undefined {
  const { histogram } = view;
  if (!histogram) return undefined;
  const { from, to, counts } = histogram;
  const step = (to - from) / counts.length;
  const xs = counts.map((_, i) => from + (i + 0.5) * step);
  const x = resultAxis(topology, result);
  return {
    id: "histogram",
    name: `Boards over ${x.quantity.toLowerCase()}`,
    x: axisOf(x, stretched([from, to], windows[result]), xRoom(room), false),
    y: axisOf(boardsAxis, [0, Math.max(...counts)], yRoom(room), false),
    xs,
    lines: [{ id: "boards", label: "boards", ys: counts, drawn: "bars" }],
    ...sidesOf({ x: windows[result] }, [from, to]),
  };
}

/** Two results of each board, with the box of both windows. */
export function scatterModel(
  topology: AnyTopology,
  view: SpreadView,
  [result, against]: readonly [string, string],
  windows: ResultWindows,
  room: PlotRoom,
): PlotModel | undefined {
  const { scatter } = view;
  if (!scatter || scatter.x.length === 0) return undefined;
  const order = scatter.x.map((_, i) => i).sort((a, b) => scatter.x[a]! - scatter.x[b]!);
  const ys = (good: boolean) => order.map((i) => (scatter.good[i] === good ? scatter.y[i]! : null));
  const [across, up] = [extent(scatter.x), extent(scatter.y)];
  const axes = [resultAxis(topology, result), resultAxis(topology, against)] as const;
  return {
    id: "scatter",
    name: `${axes[1].quantity} over ${axes[0].quantity.toLowerCase()}`,
    x: axisOf(axes[0], stretched(across, windows[result]), xRoom(room), false),
    y: axisOf(axes[1], stretched(up, windows[against]), yRoom(room), false),
    xs: order.map((i) => scatter.x[i]!),
    lines: [
      { id: "good", label: "good", ys: ys(true), drawn: "dots" },
      { id: "outside", label: "outside a window", ys: ys(false), drawn: "dots" },
    ],
    ...sidesOf({ x: windows[result], y: windows[against] }, across, up),
  };
}

const lowest = 60;

/** The curve of the middle board, and the stretch that nine boards of ten keep to. */
export function bandModel(
  curve: PlotCurve,
  view: SpreadView,
  wanted: { x?: readonly [number, number]; y?: readonly [number, number] } | undefined,
  room: PlotRoom,
): PlotModel | undefined {
  const points = view.band?.points ?? [];
  if (points.length < 2) return undefined;
  const [across, up] = [curve.x.shown?.factor ?? 1, curve.y.shown?.factor ?? 1];
  const xs = points.map(([x]) => x * across);
  const line = (at: 1 | 2 | 3) => points.map((point) => point[at] * up);
  const [bottom, most] = extent([...line(1), ...line(3)]);
  let least = bottom;
  if ((curve.y.shown?.unit ?? curve.y.unit) === "dB") least = Math.max(least, most - lowest);
  if (curve.y.scale === "logarithmic") least = Math.max(least, most * 1e-9);
  return {
    id: `${curve.id}-band`,
    name: `${curve.name}, nine boards of ten`,
    x: axisOf(curve.x, [xs[0]!, xs.at(-1)!], xRoom(room), true),
    y: axisOf(curve.y, [least, most], yRoom(room), false),
    xs,
    lines: [
      { id: "middle", label: "middle board", ys: line(2) },
      { id: "low", label: "5 %", ys: line(1), drawn: "edge" },
      { id: "high", label: "95 %", ys: line(3), drawn: "edge" },
    ],
    area: ["low", "high"],
    ...(wanted && {
      window: {
        ...(wanted.x && { x: [wanted.x[0] * across, wanted.x[1] * across] }),
        ...(wanted.y && { y: [wanted.y[0] * up, wanted.y[1] * up] }),
      },
    }),
  };
}

function resultAxis(topology: AnyTopology, name: string): Axis {
  const { label, unit }: { label: string; unit: Unit } = topology.results[name]!;
  return { quantity: label, unit, scale: "linear" };
}

type Sides = ResultWindows[string];

/** Room for the boards and for the window, but not for one that lies far off. */
function stretched([from, to]: readonly [number, number], window: Sides | undefined): [number, number] {
  const reach = 2 * (to - from);
  const { least = from, most = to } = window ?? {};
  return [Math.min(from, least > from - reach ? least : from), Math.max(to, most < to + reach ? most : to)];
}

/** A side that is open reaches past the boards. */
function sidesOf(
  sides: { x?: Sides | undefined; y?: Sides | undefined },
  across: readonly [number, number],
  up: readonly [number, number] = [0, 0],
): Pick<PlotModel, "window"> {
  const closed = (window: Sides | undefined, [from, to]: readonly [number, number]) => {
    if (!window) return undefined;
    const beyond = 10 * (to - from);
    return [window.least ?? from - beyond, window.most ?? to + beyond] as const;
  };
  const [x, y] = [closed(sides.x, across), closed(sides.y, up)];
  if (!x && !y) return {};
  return { window: { ...(x && { x }), ...(y && { y }) } };
}

function extent(values: readonly number[]): [number, number] {
  let [least, most] = [Infinity, -Infinity];
  for (const value of values) {
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return [least, most];
}
