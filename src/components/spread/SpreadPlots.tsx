import { useMemo } from "react";
import type { SpreadView } from "#lib/circuit/analysis/spread/index.ts";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { StillPlot } from "../plot/StillPlot.tsx";
import { bandModel, histogramModel, scatterModel } from "./models.ts";
import type { Spread } from "./useSpread.ts";

interface SpreadPlotsProps {
  topology: AnyTopology;
  spread: Spread;
  view: SpreadView;
  fileName: string;
}

/** The curve with its band, the histogram with its window, and two results against each other. */
export function SpreadPlots({ topology, spread, view, fileName }: SpreadPlotsProps) {
  const { settings, request, against } = spread;
  const windows = useMemo(() => request?.window ?? {}, [request]);
  const curve = topology.curves.find(({ id }) => id === view.band?.curve);
  const { label } = topology.results[settings.result]!;
  const byTarget = Object.fromEntries(
    Object.entries(topology.targets).flatMap(([key, { result }]) => {
      const { least, most } = windows[result] ?? {};
      return least === undefined || most === undefined ? [] : [[key, { least, most }]];
    }),
  );
  return (
    <div className="spread-plots">
      {curve && (
        <StillPlot
          name={`${curve.name}, nine boards of ten`}
          fileName={fileName}
          modelFor={(room) => bandModel(curve, view, curve.window?.(byTarget), room)}
          empty="No board has a curve to draw."
        />
      )}
      <StillPlot
        name={`Boards over ${label.toLowerCase()}`}
        fileName={fileName}
        modelFor={(room) => histogramModel(topology, view, settings.result, windows, room)}
        empty="Every board gives the same figure: none of the parts that vary moves it."
      />
      {against !== undefined && (
        <StillPlot
          name={`${topology.results[against]!.label} over ${label.toLowerCase()}, the first 500 boards`}
          fileName={fileName}
          modelFor={(room) => scatterModel(topology, view, [settings.result, against], windows, room)}
          empty="No board gives both figures."
        />
      )}
    </div>
  );
}
