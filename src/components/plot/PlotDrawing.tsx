import { useId } from "react";
import { PlotArea, PlotMarks } from "./PlotMarks.tsx";
import { margins, placing, tickText, type PlotModel, type PlotRoom } from "./plotModel.ts";
import { colourOf, dashOf, pagePalette, strokeOf, type PlotPalette } from "./palette.ts";

interface PlotDrawingProps {
  model: PlotModel;
  room: PlotRoom;
  palette?: PlotPalette;
  /** Writes name and legend into the drawing: for a file that stands alone. */
  alone?: boolean;
  /** Which x the readout stands at. */
  at?: number | null;
}

/** A plot as plain SVG: what the server sends, what a file holds, and what stands until the interactive plot has loaded. */
export function PlotDrawing({ model, room, palette = pagePalette, alone = false, at = null }: PlotDrawingProps) {
  const clip = useId();
  const { x, y, width, height } = placing(model, room);
  const right = margins.left + width;
  const foot = margins.top + height;
  return (
    <svg
      xmlns="http://www.w3.org/2000/svg"
      viewBox={`0 ${alone ? -34 : 0} ${room.width} ${room.height + (alone ? 34 : 0)}`}
      width={alone ? room.width : "100%"}
      height={alone ? room.height + 34 : undefined}
      fontFamily="'Inter Variable', Inter, Helvetica, Arial, sans-serif"
      fontSize="12"
      {...(alone ? { role: "img", "aria-label": model.name } : { "aria-hidden": true })}
    >
      {alone && <rect x="0" y="-34" width={room.width} height={room.height + 34} fill={palette.sheet} />}
      {alone && <FileHead model={model} palette={palette} right={right} />}
      <clipPath id={clip}>
        <rect x={margins.left} y={margins.top} width={width} height={height} />
      </clipPath>
      <WindowBox model={model} room={room} palette={palette} clip={clip} />
      <g stroke={palette.rule} strokeWidth="1">
        {model.x.ticks.map((tick) => (
          <line key={tick} x1={x(tick)} x2={x(tick)} y1={margins.top} y2={foot} />
        ))}
        {model.y.ticks.map((tick) => (
          <line key={tick} x1={margins.left} x2={right} y1={y(tick)} y2={y(tick)} />
        ))}
        <rect x={margins.left} y={margins.top} width={width} height={height} fill="none" />
      </g>
      <g clipPath={`url(#${clip})`} fill="none" strokeLinejoin="round">
        <PlotArea model={model} room={room} palette={palette} />
        {model.lines
          .map((line, i) => <PlotMarks key={line.id} model={model} room={room} palette={palette} index={i} />)
          .reverse()}
      </g>
      {at !== null && model.xs[at] !== undefined && (
        <line x1={x(model.xs[at])} x2={x(model.xs[at])} y1={margins.top} y2={foot} stroke={palette.ink} />
      )}
      {model.mark && (
        <circle
          cx={x(model.mark.x)}
          cy={y(model.mark.y)}
          r="4"
          fill={palette.sheet}
          stroke={colourOf(palette, 0)}
          strokeWidth="2"
        />
      )}
      <g fill={palette.ink}>
        {model.x.ticks.map((tick) => (
          <text key={tick} x={x(tick)} y={foot + 16} textAnchor="middle">
            {tickText(tick, model.x)}
          </text>
        ))}
        {model.y.ticks.map((tick) => (
          <text key={tick} x={margins.left - 7} y={y(tick) + 4} textAnchor="end">
            {tickText(tick, model.y)}
          </text>
        ))}
        <text x={margins.left} y={margins.top - 10}>
          {model.y.title}
        </text>
        <text x={margins.left + width / 2} y={room.height - 6} textAnchor="middle">
          {model.x.title}
        </text>
      </g>
    </svg>
  );
}

function WindowBox({
  model,
  room,
  palette,
  clip,
}: Required<Pick<PlotDrawingProps, "model" | "room" | "palette">> & { clip: string }) {
  if (!model.window) return null;
  const { x, y } = placing(model, room);
  const [x1, x2] = model.window.x ?? model.x.domain;
  const [y1, y2] = model.window.y ?? model.y.domain;
  return (
    <rect
      x={x(x1)}
      y={y(y2)}
      width={Math.max(1, x(x2) - x(x1))}
      height={Math.max(1, y(y1) - y(y2))}
      clipPath={`url(#${clip})`}
      fill={palette.window}
      stroke={palette.windowEdge}
      strokeDasharray="3 2"
    />
  );
}

function FileHead({ model, palette, right }: { model: PlotModel; palette: PlotPalette; right: number }) {
  return (
    <g>
      <text x={margins.left} y="-12" fill={palette.ink} fontSize="14" fontWeight="600">
        {model.name}
      </text>
      {model.lines.map((line, i) => {
        const from = right - 130 * (model.lines.length - i);
        return (
          <g key={line.id}>
            <line
              x1={from}
              x2={from + 26}
              y1="-16"
              y2="-16"
              stroke={colourOf(palette, i)}
              strokeWidth={strokeOf(i)}
              strokeDasharray={dashOf(i)}
            />
            <text x={from + 32} y="-12" fill={palette.ink}>
              {line.label}
            </text>
          </g>
        );
      })}
    </g>
  );
}
