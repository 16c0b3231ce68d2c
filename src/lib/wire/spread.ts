import { z } from "zod";
import type { SpreadTask } from "#lib/circuit/analysis/calculations.ts";
import { mostBoards, type Range } from "#lib/circuit/analysis/spread/index.ts";
import type { AnyTopology, Unit } from "#lib/circuit/index.ts";
import { mostSeed } from "#lib/circuit/numeric/counterRandom.ts";
import { partTypes, typesOf } from "#lib/circuit/parts/partTypes.ts";
import { topologySchemas } from "./calculator.ts";
import { figureSchema } from "./figure.ts";
import { toleranceFault, windowFault } from "./spreadFaults.ts";

const schemas = new WeakMap<AnyTopology, ReturnType<typeof build>>();

/** What the spread of a topology is asked with; read, it is what the library is told, tolerances and drifts filled in. */
export function spreadSchema(topology: AnyTopology) {
  const known = schemas.get(topology) ?? build(topology);
  schemas.set(topology, known);
  return known;
}

const mostBandPoints = 1024;
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

/** A side left out is open. */
const windowOf = (unit: Unit) =>
  z
    .strictObject({ least: figureSchema(unit).optional(), most: figureSchema(unit).optional() })
    .superRefine(({ least, most }, context) => {
      const message = windowFault(least, most, unit);
      if (message !== undefined) context.addIssue({ code: "custom", message });
    })
    .transform(({ least, most }): Partial<Range> => ({
      ...(least !== undefined && { least }),
      ...(most !== undefined && { most }),
    }));

const temperatureRange = z
  .strictObject({
    least: z.number().min(temperatures.least).max(temperatures.most),
    most: z.number().min(temperatures.least).max(temperatures.most),
  })
  .refine(({ least, most }) => least <= most, { error: "The least must not lie above the most." });

/** One entry for each key there may be, all of them optional; what was left out is absent. */
function someOf<F, S extends z.ZodType>(fields: Readonly<Record<string, F>>, schemaOf: (field: F) => S) {
  return z.strictObject(
    Object.fromEntries(Object.entries(fields).map(([key, field]) => [key, schemaOf(field).optional()])),
  ) as unknown as z.ZodType<Record<string, z.output<S>>>;
}

function build(topology: AnyTopology) {
  const { parts, conditions } = topologySchemas(topology);
  const plain = Object.fromEntries(Object.entries(topology.results).filter(([, field]) => field.list !== true));
  const curves = topology.curves.map(({ id }) => id);
  return z
    .strictObject({
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
      window: someOf(plain, ({ unit }) => windowOf(unit))
        .optional()
        .meta({ description: "What each result may be for a board to pass" }),
      boards: boards.default(1000),
      seed: seed.default(1),
      distribution: z.enum(["uniform", "three-sigma"]).default("uniform"),
      lots: z
        .array(z.array(z.enum(Object.keys(topology.parts) as [string, ...string[]])).min(2))
        .max(32)
        .optional()
        .meta({ description: "Parts that err together" }),
      curve: z
        .enum(curves as [string, ...string[]])
        .optional()
        .meta({ description: "Whose band is wanted; the first where left out" }),
      at: z.array(z.number()).min(1).max(mostBandPoints).optional(),
      wantedYield: z
        .number()
        .gt(0)
        .lt(1)
        .optional()
        .meta({ description: "Asks which tolerances would give this share of good boards most cheaply" }),
    })
    .superRefine(({ lots, wantedYield, window }, context) => {
      faultsOfLots(topology, lots ?? []).forEach((message, i) => {
        if (message !== undefined) context.addIssue({ code: "custom", path: ["lots", i], message });
      });
      if (wantedYield !== undefined && Object.keys(window ?? {}).length === 0)
        context.addIssue({ code: "custom", path: ["window"], message: "Say what a good board is: give a window." });
    })
    .transform(({ types = {}, tolerances, drifts = {}, curve = curves[0], at, window, lots, ...asked }): SpreadTask => {
      const { conditions: given, temperature, wantedYield, ...rest } = asked;
      return {
        ...rest,
        tolerances: tolerancesOf(topology, types, tolerances),
        ...(given && { conditions: given }),
        ...(temperature && { temperature, drifts: driftsOf(topology, types, drifts) }),
        ...(window && { window }),
        ...(lots && { lots }),
        ...(wantedYield !== undefined && { wantedYield }),
        ...(curve !== undefined && { band: { curve, ...(at && { at }) } }),
      };
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

const range = z.object({ least: z.number(), most: z.number() });
const byResult = <S extends z.ZodType>(schema: S) => z.record(z.string(), schema);
const yieldAnswer = z.object({
  value: z.number().meta({ description: "Share of the boards that keep every window" }),
  low: z.number().meta({ description: "Exact 95 % bounds on the yield, Clopper and Pearson" }),
  high: z.number(),
  passed: z.int(),
});

export const spreadAnswer = z.object({
  boards: z.int(),
  seed: z.int(),
  nominal: byResult(z.number()),
  yield: yieldAnswer.optional().meta({ description: "Where a window was given" }),
  results: byResult(
    z.object({
      mean: z.number(),
      standardDeviation: z.number().meta({ description: "Of the sample, over n − 1" }),
      quantiles: z.object({ "0.05": z.number(), "0.5": z.number(), "0.95": z.number() }),
      missing: z.int().optional().meta({ description: "Boards on which the result has no meaning" }),
    }),
  ),
  worstCase: byResult(range),
  worstCaseMethod: z.enum(["every corner", "every corner and middle", "corners by sign"]),
  turning: z.array(z.string()).meta({ description: "Results whose extreme may lie inside the tolerances" }),
  rootSumSquare: byResult(z.object({ standardDeviation: z.number() })),
  sensitivities: byResult(z.record(z.string(), z.number())).meta({ description: "d ln result / d ln part" }),
  band: z
    .object({
      curve: z.string(),
      x: z.object({ quantity: z.string(), unit: z.string() }),
      y: z.object({ quantity: z.string(), unit: z.string() }),
      points: z
        .array(z.tuple([z.number(), z.number(), z.number(), z.number()]))
        .meta({ description: "x, then the 5, 50 and 95 % quantiles there" }),
      boards: z.int().meta({ description: "Boards it was taken from: the first ones" }),
    })
    .optional(),
  remedy: z
    .object({
      wanted: z.number(),
      reached: z.boolean(),
      changes: z.array(z.object({ part: z.string(), from: z.number(), to: z.number() })),
      yield: yieldAnswer,
      cost: z.number(),
      offCentre: byResult(z.number()),
    })
    .optional(),
});
