import { useMemo } from "react";
import { CartesianGrid, Line, LineChart, ReferenceArea, ReferenceDot, ReferenceLine, XAxis, YAxis } from "recharts";
import { colourOf, dashOf, pagePalette, strokeOf } from "./palette.ts";
import { margins, tickText, type PlotAxis, type PlotModel, type PlotRoom } from "./plotModel.ts";

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
  const [x1, x2] = model.window?.x ?? model.x.domain;
  const [y1, y2] = model.window?.y ?? model.y.domain;
  const axisText = { fill: palette.ink, fontSize: 12 };
  return (
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
      {model.window && (
        <ReferenceArea
          x1={Math.max(x1, model.x.domain[0])}
          x2={Math.min(x2, model.x.domain[1])}
          y1={Math.max(y1, model.y.domain[0])}
          y2={Math.min(y2, model.y.domain[1])}
          ifOverflow="hidden"
          fill={palette.window}
          fillOpacity={1}
          stroke={palette.windowEdge}
          strokeDasharray="3 2"
        />
      )}
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
      {model.mark && (
        <ReferenceDot
          x={model.mark.x}
          y={model.mark.y}
          r={4}
          ifOverflow="hidden"
          fill={palette.sheet}
          stroke={colourOf(palette, 0)}
          strokeWidth={2}
        />
      )}
      {at !== null && model.xs[at] !== undefined && <ReferenceLine x={model.xs[at]} stroke={palette.ink} />}
      {at !== null &&
        model.lines.map((line, i) => {
          const y = line.ys[at];
          if (y === null || y === undefined) return null;
          return (
            <ReferenceDot
              key={line.id}
              x={model.xs[at]!}
              y={y}
              r={3.5}
              ifOverflow="hidden"
              fill={colourOf(palette, i)}
              stroke="none"
            />
          );
        })}
    </LineChart>
  );
}

function indexOf(active: unknown): number | null {
  const index = typeof active === "string" ? Number(active) : active;
  return typeof index === "number" && Number.isInteger(index) ? index : null;
}
