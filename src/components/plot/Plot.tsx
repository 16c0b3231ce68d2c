import { lazy, Suspense, useEffect, useId, useRef, useState } from "react";
import { midSentence, type AnyTopology } from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { PlotActions } from "./PlotActions.tsx";
import { PlotDrawing } from "./PlotDrawing.tsx";
import { PlotFigures } from "./PlotFigures.tsx";
import { Cursor, Legend, readout, useWidth } from "./plotFrame.tsx";
import { plotModel, type PlotCurve, type PlotModel, type PlotRoom } from "./plotModel.ts";

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
const shortHeight = 190;

/** One curve of a stage as it stands. */
export function Plot({ topology, curve, stage, fileName, empty }: PlotProps) {
  const modelIn = (room: PlotRoom) => plotModel(topology, curve, stage, room);
  return <FramedPlot name={curve.name} fileName={fileName} empty={empty} modelIn={modelIn} />;
}

interface FramedPlotProps {
  name: string;
  fileName: string;
  /** What is drawn in so much room; undefined where there is nothing to draw. */
  modelIn: (room: PlotRoom) => PlotModel | undefined;
  empty?: string | undefined;
  /** Half as high: for what stands under another plot. */
  short?: boolean;
  /** What an address with # leads to. */
  id?: string;
}

/** A plot with its heading, legend, readout, figures and files, whatever its lines come from. */
export function FramedPlot({ name, fileName, modelIn, empty, short = false, id }: FramedPlotProps) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  const near = useNear(box);
  const [at, setAt] = useState<number | null>(null);
  const head = useId();
  const sized = (room: PlotRoom) => (short ? { ...room, height: shortHeight } : room);
  const wideRoom = sized(wide);
  const narrowRoom = sized(narrow);
  const room = width === null ? wideRoom : sized({ width, height: width < 480 ? narrow.height : wide.height });
  const model = empty === undefined ? modelIn(room) : undefined;
  const narrowModel = width === null && empty === undefined ? modelIn(narrowRoom) : undefined;

  return (
    <figure className="plot" id={id} aria-labelledby={head}>
      <figcaption className="plot-head">
        <h3 id={head}>{name}</h3>
        {model && model.lines.length > 1 && <Legend model={model} />}
      </figcaption>
      <div ref={box} className={`plot-box${model ? "" : " plot-box-empty"}${short ? " plot-box-short" : ""}`}>
        {model ? (
          <>
            {width === null ? (
              <>
                <div className="plot-wide">
                  <PlotDrawing model={model} room={wideRoom} />
                </div>
                <div className="plot-narrow">
                  {narrowModel && <PlotDrawing model={narrowModel} room={narrowRoom} />}
                </div>
              </>
            ) : near ? (
              <Suspense fallback={<PlotDrawing model={model} room={room} />}>
                <InteractivePlot model={model} room={room} at={at} onPoint={setAt} />
              </Suspense>
            ) : (
              <PlotDrawing model={model} room={room} />
            )}
            <Cursor model={model} at={at} onMove={setAt} label={`${name}: point along the curve`} />
          </>
        ) : (
          <p className="plot-empty">
            {empty ??
              `No curve: with these values ${midSentence(name)} has no figure to draw. Change a part or a target.`}
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
          <div className="plot-foot">
            <PlotFigures model={model} />
            <PlotActions model={model} fileName={fileName} />
          </div>
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
