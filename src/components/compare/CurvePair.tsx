import "../../styles/plot.css";
import { FramedPlot } from "../plot/Plot.tsx";
import { differenceModel, overlayModel, type CurvePairData, type SideLabels } from "./curveModels.ts";

interface CurvePairProps {
  pair: CurvePairData;
  labels: SideLabels;
  fileName: string;
}

/** Both sides of a curve on one axis, and their difference under it. */
export function CurvePair({ pair, labels, fileName }: CurvePairProps) {
  const same = pair.difference.every((value) => Math.abs(value) < 1e-9);
  return (
    <div className="curve-pair">
      <FramedPlot
        id={`curve-${pair.id}`}
        name={pair.name}
        fileName={fileName}
        modelIn={(room) => overlayModel(pair, labels, room)}
      />
      {same ? (
        <p className="plot text-ink-2">Both sides draw the same curve.</p>
      ) : (
        <FramedPlot
          name={`Difference: ${labels.to} less ${labels.from}`}
          fileName={fileName}
          modelIn={(room) => differenceModel(pair, labels, room)}
          short
        />
      )}
    </div>
  );
}
