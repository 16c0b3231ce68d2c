import type { Curve } from "../../stage/curve.ts";
import type { PartValues, Parts } from "../../stage/values.ts";
import { activeCurrent, worldOf, type MirrorShape, type Surroundings } from "./figures.ts";

interface MirrorState<P extends Parts> {
  parts: PartValues<P>;
  conditions: Surroundings;
}

/** Ratio over current, and current over the voltage the output is held at. */
export function mirrorCurves<P extends Parts>(
  shapeOf: (state: MirrorState<P>) => MirrorShape,
): Curve<MirrorState<P>>[] {
  return [
    {
      id: "ratio",
      name: "Ratio over current",
      x: { quantity: "Reference current", unit: "A", scale: "logarithmic" },
      y: { quantity: "Output over reference current", unit: "", scale: "linear" },
      domain: ({ conditions }) => [conditions.referenceCurrent / 1000, conditions.referenceCurrent],
      defined: [1e-10, 0.1],
      lines: (state) => {
        const shape = shapeOf(state);
        const world = worldOf(state.conditions);
        return [
          {
            id: "now",
            label: "as set",
            at: (x) => activeCurrent({ ...world, referenceCurrent: x }, shape) / x,
          },
          { id: "nominal", label: "called for", at: () => shape.nominal },
        ];
      },
      mark: ({ conditions }) => ({ x: conditions.referenceCurrent, label: "peak" }),
      window: ({ ratio }) => ratio && { y: [ratio.least, ratio.most] },
    },
    {
      id: "output",
      name: "Current over output voltage",
      x: { quantity: "Voltage at the output", unit: "V", scale: "linear" },
      y: { quantity: "Output current", unit: "A", scale: "linear" },
      domain: ({ conditions }) => [Math.min(-12, conditions.outputVoltage), conditions.railPositive - 2],
      defined: [-40, 40],
      lines: (state) => {
        const shape = shapeOf(state);
        const world = worldOf(state.conditions);
        const at = (x: number) => activeCurrent({ ...world, supply: state.conditions.railPositive - x }, shape);
        return [{ id: "now", label: "as set", at }];
      },
      mark: ({ conditions }) => ({ x: conditions.outputVoltage, label: "as set" }),
    },
  ];
}
