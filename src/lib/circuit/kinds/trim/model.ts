import { solveBracketed } from "../../numeric/solveBracketed.ts";
import { potFraction, potSlope } from "../../parts/potLaw.ts";
import type { ConditionValues } from "../../stage/values.ts";
import type { conditions } from "./fields.ts";

export type Knob = ConditionValues<typeof conditions>;

/** What a topology sets, as a function of the share of the track that is passed; it rises with that share. */
export interface Setting {
  /** Value at a share of the track, tolerances as relative deviations of each part. */
  valueAt(share: number, deviations?: Deviations): number;
  /** Slope over the share of the track, at nominal parts. */
  slopeAt(share: number): number;
}

/** Relative deviation of the pot, and of the resistor at its low and at its high end. */
export interface Deviations {
  pot: number;
  low: number;
  high: number;
}

/** Least and most wanted. */
export interface Window {
  least: number;
  most: number;
}

const lawAt = (knob: Knob, rotation: number) => potFraction(knob.potLaw, rotation, knob.midFraction, knob.lawShape);

/** Value at a rotation. */
export const valueAt = (setting: Setting, knob: Knob, rotation: number) => setting.valueAt(lawAt(knob, rotation));

/** Rotation at which a value is met, held at the ends where it lies beyond them. */
export function rotationFor(setting: Setting, knob: Knob, value: number): number {
  const excess = (x: number) => valueAt(setting, knob, x) - value;
  if (excess(0) >= 0) return 0;
  return excess(1) <= 0 ? 1 : solveBracketed(excess, 0, 1);
}

/** Slope of the value over the rotation, per whole travel. */
export const slopeAt = (setting: Setting, knob: Knob, rotation: number) =>
  setting.slopeAt(lawAt(knob, rotation)) * potSlope(knob.potLaw, rotation, knob.midFraction, knob.lawShape);

/** Ends over every corner of tolerance: the extremes of each. */
export function cornerEnds(setting: Setting, { resistorTolerance, potTolerance }: Knob) {
  const signs = [-1, 1];
  const corners = signs.flatMap((p) => signs.flatMap((l) => signs.map((h) => [p, l, h] as const)));
  const ends = (share: number) =>
    corners.map(([p, l, h]) =>
      setting.valueAt(share, { pot: p * potTolerance, low: l * resistorTolerance, high: h * resistorTolerance }),
    );
  const [lows, highs] = [ends(0), ends(1)];
  return {
    extremeLow: Math.min(...lows),
    worstLow: Math.max(...lows),
    worstHigh: Math.min(...highs),
    extremeHigh: Math.max(...highs),
  };
}

/** Share by which the worst unit reaches past the window at its tighter end. */
export function worstCaseMargin(worstLow: number, worstHigh: number, { least, most }: Window): number {
  const high = worstHigh / most - 1;
  return worstLow > 0 ? Math.min(high, least / worstLow - 1) : high;
}

/** Rheostat in series with a fixed resistor: R = Rfix + Rpot·(e + (1 − e)·a). */
export function rheostatSetting({ rFixed, rPot }: { rFixed: number; rPot: number }, end: number): Setting {
  return {
    valueAt: (share, { pot, low } = nominal) => rFixed * (1 + low) + rPot * (1 + pot) * (end + (1 - end) * share),
    slopeAt: () => rPot * (1 - end),
  };
}

export interface DividerParts {
  rTop: number;
  rPot: number;
  rBottom: number;
}

/** Wiper of a pot between two resistors, V = Vref·n∥RL/(n∥RL + S − n) with n the resistance below the wiper. */
export function dividerSetting(
  { rTop, rPot, rBottom }: DividerParts,
  end: number,
  reference: number,
  load: number | null,
): Setting {
  const shareOf = (share: number) => end + (1 - 2 * end) * share;
  const conductance = load === null ? 0 : 1 / load;
  return {
    valueAt: (share, { pot, low, high } = nominal) => {
      const [track, bottom, top] = [rPot * (1 + pot), rBottom * (1 + low), rTop * (1 + high)];
      const sum = top + track + bottom;
      const below = bottom + track * shareOf(share);
      return (reference * below) / (sum + below * (sum - below) * conductance);
    },
    slopeAt: (share) => {
      const sum = rTop + rPot + rBottom;
      const below = rBottom + rPot * shareOf(share);
      const divisor = sum + below * (sum - below) * conductance;
      return (reference * (sum + below ** 2 * conductance) * rPot * (1 - 2 * end)) / divisor ** 2;
    },
  };
}

/** Resistance seen at the wiper, Ω; its largest value lies where both sides are equal. */
export function wiperResistance({ rTop, rPot, rBottom }: DividerParts, share: number) {
  const sum = rTop + rPot + rBottom;
  const at = (below: number) => (below * (sum - below)) / sum;
  const largest = at(Math.min(Math.max(sum / 2, rBottom), rBottom + rPot));
  return { asSet: at(rBottom + rPot * share), largest };
}

const nominal: Deviations = { pot: 0, low: 0, high: 0 };
