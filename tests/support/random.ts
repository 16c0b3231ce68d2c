import fc from "fast-check";
import type { AnyTopology, ConditionField, NumberField, PlainConditions, PlainValues } from "#lib/circuit/index.ts";
import { acceptedRange } from "#lib/circuit/index.ts";

/** A figure spread evenly over its decades; plain draws of doubles would crowd around a logarithm of zero. */
export const logarithmic = (least: number, most: number): fc.Arbitrary<number> =>
  fc.integer({ min: 0, max: 1_000_000 }).map((k) => Math.min(most, least * (most / least) ** (k / 1_000_000)));

/**
 * A figure within the sane range of its field, stretched by `reach` on both sides but never past what is accepted.
 * Zero is a case of its own (not fitted) that a plain draw never meets; past the usual range, absurdly small figures
 * are drawn too.
 */
export function valueOf(field: NumberField, reach = 1): fc.Arbitrary<number> {
  const [lowest, highest] = acceptedRange(field);
  if (field.scale === "linear") {
    const slack = ((field.most - field.least) * (reach - 1)) / 2;
    const [min, max] = [Math.max(lowest, field.least - slack), Math.min(highest, field.most + slack)];
    return reach > 1
      ? fc.double({ min, max, noNaN: true })
      : fc.integer({ min: 0, max: 1000 }).map((k) => min + ((max - min) * k) / 1000);
  }
  const most = Math.min(highest, field.most * reach);
  if (field.least > 0) return logarithmic(Math.max(lowest, field.least / reach), most);
  const usual = [fc.constant(0), logarithmic(field.most / 1e6, most)];
  return fc.oneof(...usual, ...(reach > 1 ? [fc.double({ min: 0, max: most, noNaN: true })] : []));
}

function conditionOf(field: ConditionField, reach: number): fc.Arbitrary<number | string | null> {
  if (field.type === "choice") return fc.constantFrom(...field.options.map(({ value }) => value));
  return field.default === null ? fc.option(valueOf(field, reach)) : valueOf(field, reach);
}

export const partsOf = (topology: AnyTopology, reach = 1): fc.Arbitrary<PlainValues> =>
  fc.record(Object.fromEntries(Object.entries(topology.parts).map(([key, field]) => [key, valueOf(field, reach)])));

export const conditionsOf = (topology: AnyTopology, reach = 1): fc.Arbitrary<PlainConditions> =>
  fc.record(
    Object.fromEntries(Object.entries(topology.conditions).map(([key, field]) => [key, conditionOf(field, reach)])),
  );

export const targetsOf = (topology: AnyTopology): fc.Arbitrary<PlainValues> =>
  fc.record(Object.fromEntries(Object.entries(topology.targets).map(([key, field]) => [key, valueOf(field)])));

/** The seed is fixed so that a failure is met again by everyone; raise the number of runs to look further. */
export const runs = (count: number) => ({ numRuns: count, seed: 20240607 });
