import { useEffect, useState, type KeyboardEvent, type RefObject } from "react";
import { colourOf, dashOf, pagePalette, strokeOf } from "./palette.ts";
import { edgeDash } from "./PlotMarks.tsx";
import { readoutText, type PlotLine, type PlotModel } from "./plotModel.ts";

export function Legend({ model }: { model: PlotModel }) {
  return (
    <ul className="plot-legend">
      {model.lines.map((line, i) => (
        <li key={line.id}>
          <svg width={line.drawn ? 12 : 26} height="8" aria-hidden="true">
            <Sample drawn={line.drawn} index={i} />
          </svg>
          {line.label}
        </li>
      ))}
    </ul>
  );
}

/** What a line looks like on the plot. */
function Sample({ drawn, index }: { drawn: PlotLine["drawn"]; index: number }) {
  const colour = colourOf(pagePalette, index);
  if (drawn === "edge")
    return <path d="M0 4h12" stroke={colourOf(pagePalette, 0)} strokeDasharray={edgeDash[index % 2]} />;
  if (drawn === "bars") return <rect width="10" height="8" fill={colour} fillOpacity="0.55" />;
  if (drawn === "dots" && index === 0) return <circle cx="5" cy="4" r="2.6" fill={colour} />;
  if (drawn === "dots") return <path d="M2 1l6 6M8 1l-6 6" stroke={colour} strokeWidth="1.4" />;
  return (
    <line x1="0" x2="26" y1="4" y2="4" stroke={colour} strokeWidth={strokeOf(index)} strokeDasharray={dashOf(index)} />
  );
}

interface CursorProps {
  model: PlotModel;
  at: number | null;
  onMove: (index: number | null) => void;
  label: string;
}

/** The keyboard's way along the curve; a slider, so that each step is announced with its figures. */
export function Cursor({ model, at, onMove, label }: CursorProps) {
  const last = model.xs.length - 1;
  const now = at ?? startOf(model);
  const onKeyDown = (event: KeyboardEvent) => {
    const step = event.shiftKey ? 10 : 1;
    const moves: Record<string, number> = {
      ArrowRight: now + step,
      ArrowUp: now + step,
      ArrowLeft: now - step,
      ArrowDown: now - step,
      PageUp: now + 20,
      PageDown: now - 20,
      Home: 0,
      End: last,
    };
    const next = moves[event.key];
    if (event.key === "Escape") onMove(null);
    if (next === undefined) return;
    event.preventDefault();
    onMove(Math.min(last, Math.max(0, next)));
  };
  return (
    <div
      className="plot-cursor needs-js"
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={last}
      aria-valuenow={now}
      aria-valuetext={readout(model, now)}
      onKeyDown={onKeyDown}
      onFocus={() => onMove(now)}
      onBlur={() => onMove(null)}
    />
  );
}

/** The readout begins at the operating point. */
function startOf(model: PlotModel): number {
  const wanted = model.mark?.x;
  if (wanted === undefined) return Math.floor(model.xs.length / 2);
  const index = model.xs.findIndex((x) => x >= wanted);
  return index === -1 ? model.xs.length - 1 : index;
}

/** Every line at one point, in words. */
export function readout(model: PlotModel, at: number): string {
  const index = Math.min(at, model.xs.length - 1);
  const figures = model.lines.map((line) => {
    const y = line.ys[index];
    const figure = y === null || y === undefined ? "no value" : readoutText(y, model.y.unit);
    return model.lines.length > 1 ? `${line.label} ${figure}` : figure;
  });
  return `${readoutText(model.xs[index]!, model.x.unit)}: ${figures.join(" · ")}`;
}

/** Narrower than this nothing can be read off a plot. */
const leastWidth = 160;

/** The width of an element in whole pixels; null until it is on the page. */
export function useWidth(box: RefObject<HTMLDivElement | null>): number | null {
  const [width, setWidth] = useState<number | null>(null);
  useEffect(() => {
    const element = box.current;
    if (!element) return undefined;
    const observer = new ResizeObserver(([entry]) => {
      // A plot out of sight has no width; it keeps the one it had.
      if (entry && entry.contentRect.width >= leastWidth) setWidth(Math.floor(entry.contentRect.width));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [box]);
  return width;
}
