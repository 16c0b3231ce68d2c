import { electricalAngle } from "../../parts/electricalAngle.ts";
import { potFraction } from "../../parts/potLaw.ts";
import type { Curve, Line } from "../../stage/curve.ts";
import { chargeAt, dischargeAt, type EnvelopeState } from "./analyse.ts";
import { decayFactor } from "./model.ts";

/** What is drawn of a silence: far below what is heard, and finite. */
const floorDb = -100;

const time = { quantity: "Time", unit: "s", scale: "linear" } as const;

/** The voltage on the capacitor from the start of the pulse, at a rotation; zero where the diode never opens. */
function voltageOver(state: EnvelopeState, rotation: number): (x: number) => number {
  const charge = chargeAt(state, rotation);
  const { resistance, rest } = dischargeAt(state, rotation);
  if (!charge) return () => rest;
  const tau = state.parts.c * resistance;
  return (x) => (x < charge.width ? charge.at(x) : rest + (charge.peak - rest) * Math.exp((charge.width - x) / tau));
}

/** The control that the next stage sees, v less its dead band, in decibels under its peak. */
function controlDb(state: EnvelopeState, rotation: number): (x: number) => number {
  const voltage = voltageOver(state, rotation);
  const { deadBand } = state.conditions;
  const peak = (chargeAt(state, rotation)?.peak ?? 0) - deadBand;
  return (x) => {
    const share = (voltage(x) - deadBand) / peak;
    return peak > 0 && share > 0 ? Math.max(floorDb, 20 * Math.log10(share)) : floorDb;
  };
}

const lines = (
  state: EnvelopeState,
  draw: (state: EnvelopeState, rotation: number) => (x: number) => number,
): Line[] => [
  { id: "now", label: "as set", at: draw(state, state.conditions.rotation) },
  { id: "shortest", label: "pot at 0°", at: draw(state, 0) },
  { id: "longest", label: `pot at ${electricalAngle}°`, at: draw(state, 1) },
];

/** To −60 dB of the present decay, on a whole 1-2-5 step, so that the axis does not crawl while a value is turned. */
function domain(state: EnvelopeState): readonly [number, number] {
  const end = (state.conditions.pulseWidth ?? 0) + decayFactor(60) * state.parts.c * dischargeAt(state).resistance;
  const decade = 10 ** Math.floor(Math.log10(end));
  return [0, [1, 2, 5, 10].find((m) => m * decade >= end * (1 - 1e-9))! * decade];
}

const mark = (state: EnvelopeState) => {
  const { deadBand, pulseWidth } = state.conditions;
  const { resistance, rest } = dischargeAt(state);
  const peak = chargeAt(state)?.peak ?? 0;
  if (!(deadBand > rest && deadBand < peak)) return { x: pulseWidth ?? 0, label: "peak" };
  const end = state.parts.c * resistance * Math.log((peak - rest) / (deadBand - rest));
  return { x: (pulseWidth ?? 0) + end, label: "into the dead band" };
};

export const curves: readonly Curve<EnvelopeState>[] = [
  {
    id: "envelope",
    name: "Envelope",
    x: time,
    y: { quantity: "Voltage", unit: "V", scale: "linear" },
    domain,
    defined: [0, Infinity],
    lines: (state) => lines(state, voltageOver),
    mark,
  },
  {
    id: "envelope-db",
    name: "Envelope as the next stage hears it",
    x: time,
    y: { quantity: "Level under the peak", unit: "dB", scale: "linear" },
    domain,
    defined: [0, Infinity],
    lines: (state) => lines(state, controlDb),
    mark,
  },
  {
    id: "knob",
    name: "Decay over rotation",
    x: { quantity: "Rotation", unit: "", scale: "linear", shown: { unit: "°", factor: electricalAngle } },
    y: { quantity: "Decay to −60 dB", unit: "s", scale: "logarithmic" },
    domain: () => [0, 1],
    defined: [0, 1],
    lines: (state) => [
      {
        id: "now",
        label: "as set",
        at: (rotation) => decayFactor(60) * state.parts.c * dischargeAt(state, rotation).resistance,
      },
      {
        id: "unloaded",
        label: "without load and leakage",
        at: (rotation) => {
          const { parts, conditions } = state;
          return decayFactor(60) * parts.c * (parts.rMin + parts.rPot * potFraction(conditions.potLaw, rotation));
        },
      },
    ],
    mark: (state) => ({ x: state.conditions.rotation, label: "as set" }),
    window: ({ shortestDecayTime60, longestDecayTime60 }) =>
      shortestDecayTime60 && longestDecayTime60 && { y: [shortestDecayTime60.least, longestDecayTime60.most] as const },
  },
];
