import { parseQuantity } from "./parse.ts";

/** Tolerance letters for symmetric relative tolerances (IEC 60062:2016, clause on tolerance codes; values as listed in `tests/reference`). */
const toleranceLetters: Record<string, number> = {
  E: 0.00005,
  L: 0.0001,
  P: 0.0002,
  W: 0.0005,
  B: 0.001,
  C: 0.0025,
  D: 0.005,
  F: 0.01,
  G: 0.02,
  H: 0.03,
  J: 0.05,
  K: 0.1,
  M: 0.2,
  N: 0.3,
};

export interface Marking {
  /** Ohms or farads. */
  value: number;
  /** Relative, 0.1 for ±10 %; undefined where the marking carries no letter. */
  tolerance: number | undefined;
}

/**
 * Reads a marking as printed on a resistor or capacitor: `4K7`, `4K7K` (4.7 kΩ ±10 %), `R47J`, `n33M`.
 * Only a letter that follows the whole value is a tolerance, so `47K` is 47 kΩ without one.
 *
 * @returns undefined where the text is no marking
 */
export function parseMarking(text: string): Marking | undefined {
  const trimmed = text.trim();
  const whole = parseQuantity(trimmed);
  if (whole.ok) return { value: whole.value, tolerance: undefined };
  const tolerance = toleranceLetters[trimmed.at(-1) ?? ""];
  const rest = parseQuantity(trimmed.slice(0, -1));
  return tolerance !== undefined && rest.ok ? { value: rest.value, tolerance } : undefined;
}
