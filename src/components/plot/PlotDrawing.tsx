import { useId } from "react";
import { margins, placing, tickText, type PlotModel, type PlotRoom } from "./plotModel.ts";

/** Colours as values of SVG attributes: variables on the page, plain colours in a file. */
export interface PlotPalette {
  curves: readonly string[];
  ink: string;
  faint: string;
  rule: string;
  sheet: string;
  window: string;
  windowEdge: string;
}

const orders = [1, 2, 3, 4, 5, 6];

/** Okabe-Ito in a fixed order, light or dark as the page is. */
export const pagePalette: PlotPalette = {
  curves: orders.map((n) => `var(--c${n})`),
  ink: "var(--ink-2)",
  faint: "var(--ink-3)",
  rule: "var(--rule)",
  sheet: "var(--sheet)",
  window: "var(--accent-soft)",
  windowEdge: "var(--accent)",
};

/** Each line's own dash, so that a greyscale print still tells them apart. */
const dashes = [undefined, "2 3", "7 4", "9 3 2 3", "12 4", "4 2 1 2 1 2"];

export const colourOf = (palette: PlotPalette, index: number) => palette.curves[index % palette.curves.length]!;
export const dashOf = (index: number) => dashes[index % dashes.length];
export const strokeOf = (index: number) => (index === 0 ? 2 : 1.6);

interface PlotDrawingProps {
  model: PlotModel;
  room: PlotRoom;
  palette?: PlotPalette;
  /** Writes name and legend into the drawing: for a file that stands alone. */
  alone?: boolean;
}

/** A plot as plain SVG: what the server sends, what a file holds, and what stands until the interactive plot has loaded. */
export function PlotDrawing({ model, room, palette = pagePalette, alone = false }: PlotDrawingProps) {
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
        {model.lines
          .map((line, i) => (
            <path
              key={line.id}
              d={pathOf(model.xs, line.ys, x, y)}
              // A tenth of a pixel may still fall the other way in the browser's arithmetic.
              suppressHydrationWarning
              stroke={colourOf(palette, i)}
              strokeWidth={strokeOf(i)}
              strokeDasharray={dashOf(i)}
            />
          ))
          .reverse()}
      </g>
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
            {tickText(tick, model.x.unit)}
          </text>
        ))}
        {model.y.ticks.map((tick) => (
          <text key={tick} x={margins.left - 7} y={y(tick) + 4} textAnchor="end">
            {tickText(tick, model.y.unit)}
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
