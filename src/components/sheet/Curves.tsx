import { memo } from "react";
import type { AnyTopology } from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { Plot } from "../plot/Plot.tsx";
import { anyPotFitted } from "./pots.ts";

interface CurvesProps {
  topology: AnyTopology;
  curves: AnyTopology["curves"];
  state: StageState;
  fileName: string;
}

/** Some of the curves that the topology can draw. Held apart so that typing never waits for a plot. */
export const Curves = memo(function Curves({ topology, curves, state, fileName }: CurvesProps) {
  const idle = !anyPotFitted(topology, state.parts);
  return curves.map((curve) => (
    <Plot
      key={curve.id}
      topology={topology}
      curve={curve}
      stage={state}
      fileName={fileName}
      empty={
        idle && curve.x.shown?.unit === "°"
          ? "No pot is fitted, so there is nothing to turn. Give the pot a value among the parts and its travel is drawn here."
          : undefined
      }
    />
  ));
});
