import { z } from "zod";
import { mostBoards, type BoardsRequest, type Range } from "#lib/circuit/analysis/spread/index.ts";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { mostSeed } from "#lib/circuit/numeric/counterRandom.ts";
import { partTypes, typesOf } from "#lib/circuit/parts/partTypes.ts";
import { topologySchemas } from "./calculator.ts";
import { toleranceFault } from "./spreadFaults.ts";

/** The temperatures that any stage can be computed at, K. */
const temperatures = { least: 200, most: 450 };
const mostDrift = 0.01;

const tolerance = z.number().superRefine((value, context) => {
  const message = toleranceFault(value);
  if (message !== undefined) context.addIssue({ code: "custom", message });
});
const drift = z.number().min(-mostDrift).max(mostDrift);
const boards = z.int().min(1).max(mostBoards);
const seed = z.int().min(0).max(mostSeed);

const temperatureRange = z
  .strictObject({
    least: z.number().min(temperatures.least).max(temperatures.most),
    most: z.number().min(temperatures.least).max(temperatures.most),
  })
  .refine(({ least, most }) => least <= most, { error: "The least must not lie above the most." });

/** One entry for each key there may be, all of them optional; what was left out is absent. */
export function someOf<F, S extends z.ZodType>(fields: Readonly<Record<string, F>>, schemaOf: (field: F) => S) {
  return z.strictObject(
    Object.fromEntries(Object.entries(fields).map(([key, field]) => [key, schemaOf(field).optional()])),
  ) as unknown as z.ZodType<Record<string, z.output<S>>>;
}

/** What every question about random boards is asked with. */
export function boardFields(topology: AnyTopology) {
  const { parts, conditions } = topologySchemas(topology);
  return {
    parts,
    conditions: conditions.optional(),
    types: someOf(topology.parts, ({ partClass }) => z.enum(typesOf(partClass).map(({ id }) => id)))
      .optional()
      .meta({ description: "What sort of part each is: it gives the usual tolerance and drift" }),
    tolerances: someOf(topology.parts, () => tolerance)
      .optional()
      .meta({ description: "Relative, to either side; a part not listed is exact. Left out whole: the usual ones" }),
    drifts: someOf(topology.parts, () =>
      z.union([
        drift.transform((value): Range => ({ least: value, most: value })),
        z
          .strictObject({ least: drift, most: drift })
          .refine(({ least, most }) => least <= most, { error: "The least must not lie above the most." }),
      ]),
    )
      .optional()
      .meta({ description: "Relative change per kelvin from 25 °C; matters with `temperature`" }),
    temperature: temperatureRange
      .optional()
      .meta({ description: "Boards are at any temperature between, K; left out, all at that of the conditions" }),
    boards: boards.default(1000),
    seed: seed.default(1),
    distribution: z.enum(["uniform", "three-sigma"]).default("uniform"),
    lots: z
      .array(z.array(z.enum(Object.keys(topology.parts) as [string, ...string[]])).min(2))
      .max(32)
      .optional()
      .meta({ description: "Parts that err together" }),
  };
}

type AskedBoards = z.output<z.ZodObject<ReturnType<typeof boardFields>>>;

/** As the library is told, tolerances and drifts filled in. */
export function readBoards(topology: AnyTopology, asked: AskedBoards): BoardsRequest {
  const { types = {}, tolerances, drifts = {}, conditions, temperature, lots } = asked;
  return {
    parts: asked.parts,
    boards: asked.boards,
    seed: asked.seed,
    distribution: asked.distribution,
    tolerances: tolerancesOf(topology, types, tolerances),
    ...(conditions && { conditions }),
    ...(temperature && { temperature, drifts: driftsOf(topology, types, drifts) }),
    ...(lots && { lots }),
  };
}

/** Adds what is wrong with the lots. */
export function checkLots(topology: AnyTopology, lots: AskedBoards["lots"], context: z.RefinementCtx): void {
  faultsOfLots(topology, lots ?? []).forEach((message, i) => {
    if (message !== undefined) context.addIssue({ code: "custom", path: ["lots", i], message });
  });
}

function faultsOfLots(topology: AnyTopology, lots: readonly (readonly string[])[]): (string | undefined)[] {
  const seen = new Set<string>();
  return lots.map((lot) => {
    const twice = lot.find((part) => seen.has(part) || (seen.add(part), false));
    if (twice !== undefined) return `${twice} stands in more than one place. A part comes from one lot.`;
    const classes = new Set(lot.map((part) => topology.parts[part]!.partClass));
    return classes.size > 1 ? "Parts of different sorts do not come from one lot." : undefined;
  });
}

const typeNamed = (id: string | undefined) => partTypes.find((type) => type.id === id);

function tolerancesOf(
  topology: AnyTopology,
  types: Record<string, string>,
  given: Record<string, number> | undefined,
): Record<string, number> {
  const entries = Object.entries(topology.parts).map(([part, field]): [string, number | undefined] => {
    const usual = typeNamed(types[part])?.tolerance;
    return [part, given?.[part] ?? usual ?? (given ? undefined : field.tolerance)];
  });
  return Object.fromEntries(entries.filter((entry): entry is [string, number] => entry[1] !== undefined));
}

function driftsOf(
  topology: AnyTopology,
  types: Record<string, string>,
  given: Record<string, Range>,
): Record<string, Range> {
  return Object.fromEntries(
    Object.entries(topology.parts).map(([part, { partClass }]) => {
      const type = typeNamed(types[part]) ?? typesOf(partClass)[0]!;
      return [part, given[part] ?? type.drift];
    }),
  );
}
