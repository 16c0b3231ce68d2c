import type { Curve } from "../../../../stage/curve.ts";
import { edgeShare, velocityOf, velocityPeak } from "../../model.ts";
import { analyse, edgeVoltage, type ThresholdState } from "./analyse.ts";
import { heldWidth, offNetwork, thresholdAt } from "./model.ts";

/** The voltage in front of RA from an upright step, the base held at its edge voltage while it conducts. */
function afterDifferentiator({ parts, conditions }: ThresholdState): (time: number) => number {
  const { pulseHeight } = conditions;
  const vbe = edgeVoltage(conditions);
  const threshold = thresholdAt(parts, vbe, 0);
  const off = offNetwork(parts);
  const width = heldWidth(parts, pulseHeight, vbe, threshold);
  if (width === undefined) return (t) => pulseHeight * off.share * Math.exp(-t / off.timeConstant);
  const re = 1 / (1 / parts.rd + 1 / parts.ra);
  const settles = (vbe * re) / parts.ra;
  const tau = (re + parts.rs) * parts.cd;
  return (t) =>
    t < width
      ? settles + (threshold - settles) * Math.exp((width - t) / tau)
      : threshold * Math.exp((width - t) / off.timeConstant);
}

export const curves: readonly Curve<ThresholdState>[] = [
  {
    id: "pulse",
    name: "Pulse at the threshold network",
    x: { quantity: "Time", unit: "s", scale: "linear" },
    y: { quantity: "Voltage", unit: "V", scale: "linear" },
    domain: (state) => [0, 2 * (analyse(state).pulseWidth ?? 2 * offNetwork(state.parts).timeConstant)],
    defined: [0, Infinity],
    lines: (state) => {
      const threshold = thresholdAt(state.parts, edgeVoltage(state.conditions), 0);
      return [
        { id: "now", label: "after the differentiator", at: afterDifferentiator(state) },
        { id: "threshold", label: "threshold", at: () => threshold },
      ];
    },
    mark: (state) => {
      const { pulseWidth } = analyse(state);
      return pulseWidth === undefined ? undefined : { x: pulseWidth, label: "pulse ends" };
    },
    window: ({ pulseWidth }) => pulseWidth && { x: [pulseWidth.least, pulseWidth.most] },
  },
  {
    id: "slow-edges",
    name: "Peak over the rise time",
    x: { quantity: "Rise time", unit: "s", scale: "logarithmic" },
    y: { quantity: "Peak", unit: "V", scale: "linear" },
    domain: ({ parts }) => {
      const { timeConstant } = offNetwork(parts);
      return [timeConstant / 100, timeConstant * 100];
    },
    defined: [Number.MIN_VALUE, Number.MAX_VALUE],
    lines: ({ parts, conditions }) => {
      const off = offNetwork(parts);
      const threshold = thresholdAt(parts, edgeVoltage(conditions), 0);
      return [
        {
          id: "now",
          label: "after the differentiator",
          at: (x) => conditions.pulseHeight * off.share * edgeShare(x, off.timeConstant),
        },
        { id: "threshold", label: "threshold", at: () => threshold },
      ];
    },
    mark: (state) => {
      const { slowestEdge } = analyse(state);
      return slowestEdge === undefined ? undefined : { x: slowestEdge, label: "slowest that fires" };
    },
  },
  {
    id: "velocity",
    name: "Envelope peak over velocity",
    x: { quantity: "Velocity", unit: "V", scale: "linear" },
    y: { quantity: "Peak", unit: "V", scale: "linear" },
    domain: () => [0, 8],
    defined: [0, Infinity],
    lines: (state) => {
      const { pulseWidth } = analyse(state);
      return [
        {
          id: "now",
          label: "as set",
          at: (velocity) => velocityPeak(velocity, velocityOf(state.conditions, pulseWidth)),
        },
        {
          id: "ideal",
          label: "without drop, fully charged",
          at: (velocity) => velocity * state.conditions.velocityGain,
        },
      ];
    },
  },
];
