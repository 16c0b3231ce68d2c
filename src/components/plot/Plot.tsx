import { lazy, Suspense, useEffect, useId, useRef, useState, type KeyboardEvent } from "react";
import type { AnyTopology } from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { PlotActions } from "./PlotActions.tsx";
import { colourOf, dashOf, pagePalette, PlotDrawing, strokeOf } from "./PlotDrawing.tsx";
import { PlotFigures } from "./PlotFigures.tsx";
import { plotModel, readoutText, type PlotCurve, type PlotModel, type PlotRoom } from "./plotModel.ts";

interface PlotProps {
  topology: AnyTopology;
  curve: PlotCurve;
  stage: StageState;
  fileName: string;
  /** What is said in place of a curve that has nothing to draw. */
  empty?: string | undefined;
}

/** The plotting library is fetched once a plot comes near the screen; without it the drawn plot stays, which shows the same. */
const InteractivePlot = lazy(() => import("./InteractivePlot.tsx").catch(() => ({ default: PlotDrawing })));

/** Drawn before the width is known: one for wide columns and one for phones, chosen by the stylesheet. */
const wide: PlotRoom = { width: 640, height: 340 };
const narrow: PlotRoom = { width: 340, height: 320 };

/** Narrower than this nothing can be read off a plot. */
const leastWidth = 160;

export function Plot({ topology, curve, stage, fileName, empty }: PlotProps) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  const near = useNear(box);
  const [at, setAt] = useState<number | null>(null);
  const head = useId();
  const room = width === null ? wide : { width, height: width < 480 ? narrow.height : wide.height };
  const model = empty === undefined ? plotModel(topology, curve, stage, room) : undefined;
  const narrowModel = width === null && empty === undefined ? plotModel(topology, curve, stage, narrow) : undefined;

  return (
    <figure className="plot" aria-labelledby={head}>
      <figcaption className="plot-head">
        <h3 id={head}>{curve.name}</h3>
        {model && model.lines.length > 1 && <Legend model={model} />}
        {model && <PlotActions model={model} fileName={fileName} />}
      </figcaption>
      <div ref={box} className={model ? "plot-box" : "plot-box plot-box-empty"}>
        {model ? (
          <>
            {width === null ? (
              <>
                <div className="plot-wide">
                  <PlotDrawing model={model} room={wide} />
                </div>
                <div className="plot-narrow">{narrowModel && <PlotDrawing model={narrowModel} room={narrow} />}</div>
              </>
            ) : near ? (
              <Suspense fallback={<PlotDrawing model={model} room={room} />}>
                <InteractivePlot model={model} room={room} at={at} onPoint={setAt} />
              </Suspense>
            ) : (
              <PlotDrawing model={model} room={room} />
            )}
            <Cursor model={model} at={at} onMove={setAt} label={`${curve.name}: point along the curve`} />
          </>
        ) : (
          <p className="plot-empty">
            {empty ??
              `No curve: with these values ${curve.name.toLowerCase()} has no figure to draw. Change a part or a target.`}
          </p>
        )}
      </div>
      {model && (
        <>
          <p className="plot-readout needs-js" aria-hidden="true">
            {at === null ? (
              <span className="dim">Point at the curve, or focus it and press ← →</span>
            ) : (
              readout(model, at)
            )}
          </p>
          <PlotFigures model={model} />
        </>
      )}
    </figure>
  );
}

function Legend({ model }: { model: PlotModel }) {
  return (
    <ul className="plot-legend">
      {model.lines.map((line, i) => (
        <li key={line.id}>
          <svg width="26" height="8" aria-hidden="true">
            <line
              x1="0"
              x2="26"
              y1="4"
              y2="4"
              stroke={colourOf(pagePalette, i)}
              strokeWidth={strokeOf(i)}
              strokeDasharray={dashOf(i)}
            />
          </svg>
          {line.label}
        </li>
      ))}
    </ul>
  );
}

interface CursorProps {
  model: PlotModel;
  at: number | null;
  onMove: (index: number | null) => void;
  label: string;
}

/** The keyboard's way along the curve; a slider, so that each step is announced with its figures. */
function Cursor({ model, at, onMove, label }: CursorProps) {
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

function readout(model: PlotModel, at: number): string {
  const index = Math.min(at, model.xs.length - 1);
  const figures = model.lines.map((line) => {
    const y = line.ys[index];
    const figure = y === null || y === undefined ? "no value" : readoutText(y, model.y.unit);
    return model.lines.length > 1 ? `${line.label} ${figure}` : figure;
  });
  return `${readoutText(model.xs[index]!, model.x.unit)}: ${figures.join(" · ")}`;
}

function useWidth(box: React.RefObject<HTMLDivElement | null>): number | null {
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

/** True once the element has come near the screen. */
function useNear(box: React.RefObject<HTMLDivElement | null>): boolean {
  const [near, setNear] = useState(false);
  useEffect(() => {
    const element = box.current;
    if (!element) return undefined;
    const observer = new IntersectionObserver(
      (entries) => {
        if (!entries.some((entry) => entry.isIntersecting)) return;
        observer.disconnect();
        setNear(true);
      },
      { rootMargin: "300px" },
    );
    observer.observe(element);
    return () => observer.disconnect();
  }, [box]);
  return near;
}
