import { lazy, Suspense, useEffect, useId, useRef, useState } from "react";
import type { AnyTopology } from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { PlotActions } from "./PlotActions.tsx";
import { PlotDrawing } from "./PlotDrawing.tsx";
import { PlotFigures } from "./PlotFigures.tsx";
import { Cursor, Legend, readout, useWidth } from "./plotFrame.tsx";
import { plotModel, type PlotCurve, type PlotRoom } from "./plotModel.ts";

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
