import type { PlainValues } from "../../stage/defaults.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import { referenceTemperature, type Distribution, type Range, type BoardsRequest } from "./request.ts";

/** A part that varies, with its own tolerance and drift. */
export interface VariedPart {
  part: string;
  nominal: number;
  tolerance: number;
  drift: Range;
}

/** What errs by itself: one part, or a lot of parts that err together. */
export interface Factor {
  parts: readonly VariedPart[];
  /** Place of its first part among the topology's; numbers its random draws, whatever else varies. */
  place: number;
}

const still: Range = { least: 0, most: 0 };

/** Everything that varies independently, in the order of the parts. A part that is not fitted does not vary. */
export function factorsOf(topology: AnyTopology, request: BoardsRequest): Factor[] {
  const keys = Object.keys(topology.parts);
  const lots = request.lots ?? [];
  const factors = new Map<number, VariedPart[]>();
  keys.forEach((part, place) => {
    const nominal = request.parts[part]!;
    const tolerance = request.tolerances[part] ?? 0;
    const drift = (request.temperature && request.drifts?.[part]) ?? still;
    if (nominal === 0 || (tolerance === 0 && drift.least === 0 && drift.most === 0)) return;
    const lot = lots.find((members) => members.includes(part));
    const first = lot ? Math.min(...lot.map((member) => keys.indexOf(member))) : place;
    factors.set(first, [...(factors.get(first) ?? []), { part, nominal, tolerance, drift }]);
  });
  return [...factors].sort(([a], [b]) => a - b).map(([place, parts]) => ({ place, parts }));
}

/** Standard deviation of a unit draw. */
export const unitDeviation: Record<Distribution, number> = { uniform: 1 / Math.sqrt(3), "three-sigma": 1 / 3 };

/** A far tail of a wide normal spread would turn a part negative: none has less than this share of its value. */
const leastShare = 0.01;

/**
 * Sets the parts of one factor.
 *
 * @param off −1 to 1 for the tolerance to either side; a normal spread may pass that
 * @param lean −1 to 1 for the least and the most drift
 */
export function setParts(values: PlainValues, { parts }: Factor, off: number, lean: number, temperature: number): void {
  const warmer = temperature - referenceTemperature;
  for (const { part, nominal, tolerance, drift } of parts) {
    const perKelvin = (drift.least + drift.most + lean * (drift.most - drift.least)) / 2;
    values[part] = nominal * Math.max(leastShare, (1 + off * tolerance) * (1 + perKelvin * warmer));
  }
}
