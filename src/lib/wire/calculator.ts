import { z } from "zod";
import { seriesNames, type AnyTopology, type ConditionField } from "#lib/circuit/index.ts";
import { quantitySchema } from "./quantity.ts";

/** Schemas of one topology's values, made from its descriptors and kept, since every request needs them. */
const schemas = new WeakMap<AnyTopology, ReturnType<typeof build>>();

export function topologySchemas(topology: AnyTopology) {
  const known = schemas.get(topology) ?? build(topology);
  schemas.set(topology, known);
  return known;
}

const mostPoints = 4096;

/** Widths are relative: 0.05 is ±5 %. */
const windowWidth = z.number().gt(0).max(1).meta({ description: "Relative half-width of the window, 0.05 for ±5 %" });

const series = z
  .union([
    z.enum(seriesNames),
    z.strictObject({ resistor: z.enum(seriesNames).optional(), capacitor: z.enum(seriesNames).optional() }),
  ])
  .transform((asked) => (typeof asked === "string" ? { resistor: asked } : asked))
  .meta({ description: "Preferred series of IEC 60063; a bare name is for the resistors. E24 and E12 where left out" });

function build(topology: AnyTopology) {
  // A part that may be zero is one that need not be fitted.
  const parts = objectOf(topology.parts, (field) =>
    field.default === 0 ? quantitySchema(field).default(0) : quantitySchema(field),
  );
  const conditions = objectOf(topology.conditions, conditionSchema);
  const targets = objectOf(topology.targets, quantitySchema);
  const someTargets = objectOf(topology.targets, (field) => quantitySchema(field).optional());
  const windows = objectOf(topology.targets, () => windowWidth.optional());
  const someParts = objectOf(topology.parts, (field) => quantitySchema(field).optional());
  return {
    parts,
    conditions,
    targets,
    someTargets,
    windows,
    analyse: z.strictObject({
      parts,
      conditions: conditions.optional(),
      targets: someTargets.optional(),
      windows: windows.optional(),
    }),
    solve: z.strictObject({
      targets,
      conditions: conditions.optional(),
      series: series.optional(),
      given: someParts.optional().meta({ description: "Parts already decided" }),
      windows: windows.optional(),
      count: z
        .int()
        .min(1)
        .max(100)
        .optional()
        .meta({ description: "How many candidates to return; 12 where left out" }),
    }),
    curves: z.strictObject({
      parts,
      conditions: conditions.optional(),
      curves: z
        .array(z.enum(topology.curves.map((curve) => curve.id) as [string, ...string[]]))
        .max(32)
        .optional(),
      at: z
        .array(z.number())
        .min(1)
        .max(mostPoints)
        .optional()
        .meta({ description: "The x values wanted, in SI base units" }),
    }),
  };
}

function conditionSchema(field: ConditionField): z.ZodType<number | string | null | undefined> {
  if (field.type === "choice") {
    return z
      .enum(field.options.map((option) => option.value) as [string, ...string[]])
      .optional()
      .meta({ title: field.label });
  }
  return field.default === null ? quantitySchema(field).nullable().optional() : quantitySchema(field).optional();
}

/** A key that was left out is absent from what is read, so `undefined` is no value of the record. */
function objectOf<F, S extends z.ZodType>(
  fields: Readonly<Record<string, F>>,
  schemaOf: (field: F) => S,
): z.ZodType<Record<string, Exclude<z.output<S>, undefined>>> {
  return z.strictObject(
    Object.fromEntries(Object.entries(fields).map(([key, field]) => [key, schemaOf(field)])),
  ) as never;
}

const resultValue = z.union([z.number(), z.array(z.number())]);
const resultsAnswer = z.record(z.string(), resultValue).meta({ description: "By name, in SI base units" });
const partsAnswer = z.record(z.string(), z.number()).meta({ description: "By role, in SI base units" });

export const warningAnswer = z.object({
  code: z.string(),
  severity: z.enum(["note", "caution", "fault"]),
  message: z.string(),
  value: z.number(),
  limit: z.number(),
  unit: z.string(),
});

export const analyseAnswer = z.object({
  results: resultsAnswer,
  warnings: z.array(warningAnswer),
  state: z
    .record(z.string(), z.enum(["within", "close", "outside"]))
    .optional()
    .meta({ description: "Of each target given" }),
});

export const solveAnswer = z.object({
  exact: z.object({ parts: partsAnswer, results: resultsAnswer }),
  candidates: z.array(
    z.object({
      parts: partsAnswer,
      results: resultsAnswer,
      errors: z.record(z.string(), z.number()),
      merit: z.number(),
    }),
  ),
  tried: z.int().meta({ description: "Combinations that were analysed" }),
  ranking: z.string().meta({ description: "What the order goes by" }),
});

const axisAnswer = z.object({ quantity: z.string(), unit: z.string() });

export const curvesAnswer = z.object({
  curves: z.array(
    z.object({
      id: z.string(),
      line: z.string().meta({ description: "now, or a companion such as the pot at one end" }),
      label: z.string(),
      x: axisAnswer,
      y: axisAnswer,
      points: z.array(z.tuple([z.number(), z.number()])),
    }),
  ),
});

export const kindsAnswer = z.object({
  kinds: z.array(
    z.object({ slug: z.string(), name: z.string(), summary: z.string(), topologies: z.array(z.string()) }),
  ),
});
