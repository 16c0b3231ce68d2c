import { useMemo } from "react";
import { CartesianGrid, Line, LineChart, XAxis, YAxis } from "recharts";
import { colourOf, dashOf, pagePalette, strokeOf } from "./palette.ts";
import { margins, placing, tickText, type PlotAxis, type PlotModel, type PlotRoom } from "./plotModel.ts";

interface InteractivePlotProps {
  model: PlotModel;
  room: PlotRoom;
  /** Which x the readout stands at. */
  at: number | null;
  onPoint: (index: number | null) => void;
}

const palette = pagePalette;
const scaleOf = (axis: PlotAxis) => (axis.scale === "logarithmic" ? "log" : "linear");

/** The plot that answers pointer and keyboard. Loaded after the page, since its library is larger than all the rest. */
export default function InteractivePlot({ model, room, at, onPoint }: InteractivePlotProps) {
  const data = useMemo(
    () => model.xs.map((x, i) => ({ x, ...Object.fromEntries(model.lines.map((line) => [line.id, line.ys[i]])) })),
    [model],
  );
  const axisText = { fill: palette.ink, fontSize: 12 };
  return (
    <>
      <LineChart
        width={room.width}
        height={room.height}
        data={data}
        margin={{ left: 0, right: margins.right, top: margins.top, bottom: 0 }}
        accessibilityLayer={false}
        onMouseMove={({ activeTooltipIndex }) => onPoint(indexOf(activeTooltipIndex))}
        onTouchMove={({ activeTooltipIndex }) => onPoint(indexOf(activeTooltipIndex))}
        onMouseLeave={() => onPoint(null)}
      >
        <WindowBox model={model} room={room} />
        <CartesianGrid stroke={palette.rule} verticalValues={model.x.ticks} horizontalValues={model.y.ticks} />
        <XAxis
          dataKey="x"
          type="number"
          scale={scaleOf(model.x)}
          domain={model.x.domain}
          ticks={model.x.ticks}
          interval={0}
          height={margins.bottom}
          tickFormatter={(value: number) => tickText(value, model.x)}
          tick={axisText}
          tickLine={false}
          axisLine={{ stroke: palette.rule }}
          allowDataOverflow
          label={{ value: model.x.title, position: "insideBottom", offset: 2, ...axisText }}
        />
        <YAxis
          type="number"
          scale={scaleOf(model.y)}
          domain={model.y.domain}
          ticks={model.y.ticks}
          interval={0}
          width={margins.left}
          tickFormatter={(value: number) => tickText(value, model.y)}
          tick={axisText}
          tickLine={false}
          axisLine={{ stroke: palette.rule }}
          allowDataOverflow
        />
        <text x={margins.left} y={margins.top - 10} fill={palette.ink} fontSize={12}>
          {model.y.title}
        </text>
        {model.lines
          .map((line, i) => (
            <Line
              key={line.id}
              dataKey={line.id}
              type="linear"
              stroke={colourOf(palette, i)}
              strokeWidth={strokeOf(i)}
              {...(dashOf(i) !== undefined && { strokeDasharray: dashOf(i)! })}
              dot={false}
              activeDot={false}
              isAnimationActive={false}
            />
          ))
          .reverse()}
      </LineChart>
      <Marks model={model} room={room} at={at} />
    </>
  );
}

type Placed = Pick<InteractivePlotProps, "model" | "room">;

/** The target, under the lines. Drawn by our own hand as in the still plot: the library's way costs thousands of bytes. */
function WindowBox({ model, room }: Placed) {
  if (!model.window) return null;
  const { x, y } = placing(model, room);
  const [left, right] = within(model.window.x, model.x).map(x);
  const [foot, top] = within(model.window.y, model.y).map(y);
  return (
    <rect
      x={left}
      y={top}
      width={Math.max(1, right! - left!)}
      height={Math.max(1, foot! - top!)}
      fill={palette.window}
      stroke={palette.windowEdge}
      strokeDasharray="3 2"
    />
  );
}

const within = (stretch: readonly [number, number] | undefined, { domain: [least, most] }: PlotAxis) =>
  (stretch ?? [least, most]).map((end) => Math.min(most, Math.max(least, end)));

/** Operating point and readout, over the lines and out of the pointer's way. */
function Marks({ model, room, at }: Placed & Pick<InteractivePlotProps, "at">) {
  const { x, y, height } = placing(model, room);
  const isDrawn = (value: number) => value >= model.y.domain[0] && value <= model.y.domain[1];
  const here = at === null ? undefined : model.xs[at];
  return (
    <svg className="plot-marks" width={room.width} height={room.height} aria-hidden="true">
      {model.mark && isDrawn(model.mark.y) && (
        <circle
          cx={x(model.mark.x)}
          cy={y(model.mark.y)}
          r="4"
          fill={palette.sheet}
          stroke={colourOf(palette, 0)}
          strokeWidth="2"
        />
      )}
      {here !== undefined && (
        <>
          <line x1={x(here)} x2={x(here)} y1={margins.top} y2={margins.top + height} stroke={palette.ink} />
          {model.lines.map((line, i) => {
            const value = line.ys[at!];
            if (value === null || value === undefined || !isDrawn(value)) return null;
            return <circle key={line.id} cx={x(here)} cy={y(value)} r="3.5" fill={colourOf(palette, i)} />;
          })}
        </>
      )}
    </svg>
  );
}

function indexOf(active: unknown): number | null {
  const index = typeof active === "string" ? Number(active) : active;
  return typeof index === "number" && Number.isInteger(index) ? index : null;
}
