import type { Axis, Curve } from "../../stage/curve.ts";
import { analyse, loadedAverage, outputAt, type CellState } from "./analyse.ts";
import { switchedRms } from "./model.ts";

const output: Axis = { quantity: "Output, RMS", unit: "V", scale: "linear" };
/** Exact points under each curve: every one is an average over Gaussian drive, too dear for each pixel. */
const knots = 25;

/** A cubic through exact points, evenly spaced: the curves here are smooth, and it stays within a thousandth of them. */
function through(f: (x: number) => number, from: number, to: number): (x: number) => number {
  const step = (to - from) / (knots - 1);
  const values = Array.from({ length: knots }, (_, k) => f(from + k * step));
  const slope = (k: number) => {
    const [low, high] = [Math.max(0, k - 1), Math.min(knots - 1, k + 1)];
    return (values[high]! - values[low]!) / (high - low);
  };
  return (x) => {
    const k = Math.min(knots - 2, Math.max(0, Math.floor((x - from) / step)));
    const t = (x - from) / step - k;
    if (t < 0 || t > 1) return f(x);
    const [a, b] = [values[k]!, values[k + 1]!];
    const rise = b - a;
    return a + t * (slope(k) + t * (3 * rise - 2 * slope(k) - slope(k + 1) + t * (slope(k) + slope(k + 1) - 2 * rise)));
  };
}

const driven = (state: CellState, sourceRms: number): CellState => ({
  ...state,
  conditions: { ...state.conditions, sourceRms },
});

export const curves: readonly Curve<CellState>[] = [
  {
    id: "output",
    name: "Output over the envelope",
    x: { quantity: "Envelope", unit: "V", scale: "linear" },
    y: output,
    domain: () => [0, 10],
    defined: [0, 40],
    lines: (state) => {
      const { duty } = loadedAverage(state, state.conditions.controlVoltage);
      return [
        { id: "now", label: "transistor", at: through((x) => outputAt(state, x), 0, 10) },
        { id: "law", label: "simple law, at the present share of on time", at: (x) => switchedRms(x, duty) },
      ];
    },
    mark: (state) => ({ x: state.conditions.controlVoltage, label: "as set" }),
    window: ({ outputRms }) => outputRms && { y: [outputRms.least, outputRms.most] },
  },
  {
    id: "drive",
    name: "Output over the drive",
    x: { quantity: "Noise at the input, RMS", unit: "V", scale: "logarithmic" },
    y: output,
    domain: () => [0.1, 3],
    defined: [1e-3, 30],
    lines: (state) => {
      const at = through((log) => outputAt(driven(state, Math.exp(log))), Math.log(0.1), Math.log(3));
      return [{ id: "now", label: "as set", at: (x) => at(Math.log(x)) }];
    },
    mark: (state) => ({ x: state.conditions.sourceRms, label: "as set" }),
  },
  {
    id: "bleed",
    name: "Output against the envelope",
    x: { quantity: "Envelope", unit: "V", scale: "linear" },
    y: { quantity: "Output over proportional", unit: "dB", scale: "linear" },
    domain: () => [0.25, 10],
    defined: [1e-3, 40],
    lines: (state) => {
      const { controlVoltage } = state.conditions;
      const whole = controlVoltage > 0 ? analyse(state).outputRms! / controlVoltage : 1;
      const at = through((x) => outputAt(state, x) / x / whole, 0.25, 10);
      return [{ id: "now", label: "as set", at: (x) => 20 * Math.log10(at(x)) }];
    },
    mark: (state) => ({ x: state.conditions.controlVoltage, label: "as set" }),
  },
];
