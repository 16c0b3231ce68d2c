import { colourOf, dashOf, strokeOf, type PlotPalette } from "./palette.ts";
import { placing, type PlotModel, type PlotRoom } from "./plotModel.ts";

interface PlotMarksProps {
  model: PlotModel;
  room: PlotRoom;
  palette: PlotPalette;
}

const dotSize = 2.2;

/** One line of a plot, as the line, the dots or the bars that it is drawn with. */
export function PlotMarks({ model, room, palette, index }: PlotMarksProps & { index: number }) {
  const line = model.lines[index]!;
  const { x, y } = placing(model, room);
  const colour = colourOf(palette, index);
  if (line.drawn === "bars") {
    const [width, foot] = [x(model.xs[1]!) - x(model.xs[0]!), y(0)];
    return (
      <g fill={colour} fillOpacity="0.55" stroke={palette.sheet} strokeWidth="0.5">
        {line.ys.map((value, i) =>
          value === null || value === 0 ? null : (
            <rect key={i} x={x(model.xs[i]!) - width / 2} y={y(value)} width={width} height={foot - y(value)} />
          ),
        )}
      </g>
    );
  }
  if (line.drawn === "dots") {
    const at = model.xs.map((value, i) => (line.ys[i] === null ? "" : `M${x(value)} ${y(line.ys[i]!)}h0`)).join("");
    // The first kind round, the others crossed, so that grey paper tells them apart.
    if (index === 0) return <path d={at} stroke={colour} strokeWidth={2 * dotSize} strokeLinecap="round" />;
    return <path d={at.replaceAll("h0", crossed)} stroke={colour} strokeWidth="1.3" />;
  }
  if (line.drawn === "edge")
    return (
      <path d={pathOf(model.xs, line.ys, x, y)} stroke={colourOf(palette, 0)} strokeDasharray={edgeDash[index % 2]} />
    );
  return (
    <path
      d={pathOf(model.xs, line.ys, x, y)}
      // A tenth of a pixel may still fall the other way in the browser's arithmetic.
      suppressHydrationWarning
      stroke={colour}
      strokeWidth={strokeOf(index)}
      strokeDasharray={dashOf(index)}
    />
  );
}

const arm = dotSize * 1.3;
const crossed = `m${-arm} ${-arm}l${2 * arm} ${2 * arm}m${-2 * arm} 0l${2 * arm} ${-2 * arm}`;

/** The lower and the upper edge of an area. */
export const edgeDash = ["5 3", "1.5 2.5"];

/** The stretch between two lines, filled. */
export function PlotArea({ model, room, palette }: PlotMarksProps) {
  const [low, high] = (model.area ?? []).map((id) => model.lines.find((line) => line.id === id)!);
  if (!low || !high) return null;
  const { x, y } = placing(model, room);
  const there = pathOf(model.xs, high.ys, x, y);
  const back = pathOf([...model.xs].reverse(), [...low.ys].reverse(), x, y).replace("M", "L");
  return <path d={`${there}${back}Z`} fill={colourOf(palette, 0)} fillOpacity="0.18" stroke="none" />;
}

function pathOf(
  xs: readonly number[],
  ys: readonly (number | null)[],
  x: (value: number) => number,
  y: (value: number) => number,
): string {
  let pen = "M";
  return xs
    .map((value, i) => {
      const height = ys[i];
      if (height === null || height === undefined) {
        pen = "M";
        return "";
      }
      const step = `${pen}${x(value)} ${y(height)}`;
      pen = "L";
      return step;
    })
    .join("");
}
