import { completeConditions, type PlainConditions, type PlainValues } from "../stage/defaults.ts";
import type { AnyTopology } from "../stage/topology.ts";

/** Step of ln(part): the error of the central difference is of its square, about 10⁻⁸, and rounding of 10⁻¹². */
const step = 1e-4;

/**
 * How strongly one result moves with each part: d ln(result) / d ln(part), by central differences of the exact analysis.
 * A part of zero (not fitted), or a result that is missing or not positive, has no entry.
 */
export function sensitivities(
  topology: AnyTopology,
  parts: PlainValues,
  given: PlainConditions,
  result: string,
): PlainValues {
  const conditions = completeConditions(topology, given) as never;
  const at = (key: string, shift: number) => {
    const value = topology.analyse({ parts: { ...parts, [key]: parts[key]! * Math.exp(shift) }, conditions })[result];
    return typeof value === "number" && value > 0 ? Math.log(value) : Number.NaN;
  };
  return Object.fromEntries(
    Object.keys(topology.parts)
      .filter((key) => parts[key]! > 0)
      .map((key): [string, number] => [key, (at(key, step) - at(key, -step)) / (2 * step)])
      .filter(([, slope]) => Number.isFinite(slope)),
  );
}
