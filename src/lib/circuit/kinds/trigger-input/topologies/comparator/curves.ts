import type { Curve } from "../../../../stage/curve.ts";
import { thresholdsAt, type ComparatorState } from "./analyse.ts";

export const curves: readonly Curve<ComparatorState>[] = [
  {
    id: "transfer",
    name: "Output over input",
    x: { quantity: "Jack", unit: "V", scale: "linear" },
    y: { quantity: "Output", unit: "V", scale: "linear" },
    domain: (state) => {
      const { rising, falling } = thresholdsAt(state);
      return [Math.min(0, falling - 1), Math.max(state.conditions.pulseHeight, rising + 1)];
    },
    lines: (state) => {
      const { rising, falling } = thresholdsAt(state);
      const { outputHigh, outputLow } = state.conditions;
      return [
        { id: "now", label: "rising", at: (x) => (x > rising ? outputHigh : outputLow) },
        { id: "falling", label: "falling", at: (x) => (x > falling ? outputHigh : outputLow) },
      ];
    },
    mark: (state) => ({ x: thresholdsAt(state).rising, label: "threshold" }),
    window: ({ threshold }) => threshold && { x: [threshold.least, threshold.most] },
  },
];
