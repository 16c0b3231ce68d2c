import type { Curve } from "../../stage/curve.ts";

/** Current over control voltage, up to a little past the peak. */
export function currentCurve<S extends { conditions: { controlVoltage: number } }>(
  currentAt: (state: S, controlVoltage: number) => number,
): Curve<S> {
  return {
    id: "current",
    name: "Current over control voltage",
    x: { quantity: "Control voltage", unit: "V", scale: "linear" },
    y: { quantity: "Current", unit: "A", scale: "linear" },
    domain: ({ conditions }) => [0, Math.max(1, Math.ceil(1.25 * conditions.controlVoltage))],
    defined: [-100, 100],
    lines: (state) => [{ id: "now", label: "as set", at: (x) => currentAt(state, x) }],
    mark: ({ conditions }) => ({ x: conditions.controlVoltage, label: "peak" }),
    window: ({ outputCurrent }) => outputCurrent && { y: [outputCurrent.least, outputCurrent.most] },
  };
}
