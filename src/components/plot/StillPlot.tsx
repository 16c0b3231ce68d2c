import { useId, useRef, useState, type PointerEvent } from "react";
import { PlotActions } from "./PlotActions.tsx";
import { PlotDrawing } from "./PlotDrawing.tsx";
import { PlotFigures } from "./PlotFigures.tsx";
import { Cursor, Legend, readout, useWidth } from "./plotFrame.tsx";
import { placing, type PlotModel, type PlotRoom } from "./plotModel.ts";

interface StillPlotProps {
  name: string;
  fileName: string;
  /** Draws for the room there is. */
  modelFor: (room: PlotRoom) => PlotModel | undefined;
  /** Said where there is nothing to draw. */
  empty: string;
  height?: number;
}

const usualHeight = 300;

/** A plot of figures that are at hand: drawn once for its width, read with pointer or keyboard. */
export function StillPlot({ name, fileName, modelFor, empty, height = usualHeight }: StillPlotProps) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  const [at, setAt] = useState<number | null>(null);
  const head = useId();
  const room = { width: width ?? 480, height };
  const model = modelFor(room);
  const onPointerMove = (event: PointerEvent<HTMLDivElement>) => {
    if (model) setAt(nearest(model, room, event.clientX - event.currentTarget.getBoundingClientRect().left));
  };
  return (
    <figure className="plot still-plot" aria-labelledby={head}>
      <figcaption className="plot-head">
        <h4 id={head}>{name}</h4>
        {model && model.lines.length > 1 && <Legend model={model} />}
        {model && <PlotActions model={model} fileName={fileName} />}
      </figcaption>
      <div
        ref={box}
        className={model ? "plot-box still-plot-box" : "plot-box plot-box-empty"}
        onPointerMove={onPointerMove}
        onPointerLeave={() => setAt(null)}
      >
        {model ? (
          <>
            <PlotDrawing model={model} room={room} at={at} />
            <Cursor model={model} at={at} onMove={setAt} label={`${name}: point along the plot`} />
          </>
        ) : (
          <p className="plot-empty">{empty}</p>
        )}
      </div>
      {model && (
        <>
          <p className="plot-readout" aria-hidden="true">
            {at === null ? (
              <span className="dim">Point at the plot, or focus it and press ← →</span>
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

function nearest(model: PlotModel, room: PlotRoom, pixel: number): number {
  const { x } = placing(model, room);
  let best = 0;
  model.xs.forEach((value, i) => {
    if (Math.abs(x(value) - pixel) < Math.abs(x(model.xs[best]!) - pixel)) best = i;
  });
  return best;
}
