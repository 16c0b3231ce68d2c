import type { AnyTopology, Axis } from "#lib/circuit/index.ts";
import type { TrimRequest } from "#lib/circuit/analysis/trim/index.ts";
import { axisOf, xRoom, yRoom, type PlotModel, type PlotRoom } from "../plot/plotModel.ts";
import { StillPlot } from "../plot/StillPlot.tsx";
import type { Trim } from "./useTrim.ts";

interface TrimPlotsProps {
  topology: AnyTopology;
  trim: Trim;
  fileName: string;
}

/** The result over the rotation with the wanted window, and where the boards' knobs end up. */
export function TrimPlots({ topology, trim: { figures, coverage, request }, fileName }: TrimPlotsProps) {
  if (!request) return null;
  const { label } = topology.results[request.result]!;
  return (
    <div className="spread-plots">
      <StillPlot
        name={`${label} over rotation`}
        fileName={fileName}
        modelFor={(room) => travelModel(topology, figures!.travel, request, room)}
        empty="No rotation gives a figure."
      />
      <StillPlot
        name="Where the knob ends up"
        fileName={fileName}
        modelFor={(room) => coverage?.rotations && rotationModel(coverage.rotations, request, room)}
        empty="Drawing the boards…"
      />
    </div>
  );
}

const rotationAxis = (angle: number): Axis => ({
  quantity: "Rotation",
  unit: "",
  scale: "linear",
  shown: { unit: "°", factor: angle },
});

function travelModel(
  topology: AnyTopology,
  travel: readonly (readonly [number, number])[],
  { result, window, knob }: TrimRequest,
  room: PlotRoom,
): PlotModel | undefined {
  if (travel.length < 2) return undefined;
  const { label, unit } = topology.results[result]!;
  const ys = travel.map(([, value]) => value);
  const stretch: [number, number] = [Math.min(window.least, ...ys), Math.max(window.most, ...ys)];
  return {
    id: "travel",
    name: `${label} over rotation`,
    x: axisOf(rotationAxis(knob.electricalAngle), [0, knob.electricalAngle], xRoom(room), true),
    y: axisOf({ quantity: label, unit, scale: "linear" }, stretch, yRoom(room), false),
    xs: travel.map(([rotation]) => rotation * knob.electricalAngle),
    lines: [{ id: "now", label, ys }],
    window: { y: [window.least, window.most] },
  };
}

function rotationModel(rotations: readonly number[], { knob }: TrimRequest, room: PlotRoom): PlotModel | undefined {
  const most = Math.max(...rotations);
  if (most === 0) return undefined;
  const step = knob.electricalAngle / rotations.length;
  return {
    id: "rotations",
    name: "Where the knob ends up",
    x: axisOf(rotationAxis(knob.electricalAngle), [0, knob.electricalAngle], xRoom(room), true),
    y: axisOf({ quantity: "Boards", unit: "", scale: "linear" }, [0, most], yRoom(room), false),
    xs: rotations.map((_, i) => (i + 0.5) * step),
    lines: [{ id: "boards", label: "boards", ys: [...rotations], drawn: "bars" }],
  };
}
