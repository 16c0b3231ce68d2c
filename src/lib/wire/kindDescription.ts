import { z } from "zod";
import {
  acceptedRange,
  type AnyTopology,
  type ConditionField,
  type NumberField,
  type ResultField,
  type StageKind,
} from "#lib/circuit/index.ts";

type Json = Record<string, unknown>;

/** Everything a script needs to know of a kind: JSON Schemas of what it takes and gives, curves, warnings, formulas, sources. */
export function describeKind(kind: StageKind): Json {
  return {
    slug: kind.id,
    name: kind.name,
    summary: kind.summary,
    place: kind.place,
    ports: kind.ports,
    topologies: kind.topologies.map(describeTopology),
  };
}

function describeTopology(topology: AnyTopology): Json {
  return {
    slug: topology.id,
    name: topology.name,
    summary: topology.summary,
    targets: objectSchema(topology.targets, (field) => ({
      ...numberSchema(field),
      result: field.result,
      window: field.window,
    })),
    parts: objectSchema(topology.parts, (field) => ({
      ...numberSchema(field),
      partClass: field.partClass,
      tolerance: field.tolerance,
    })),
    conditions: { ...objectSchema(topology.conditions, conditionSchema), required: [] },
    results: { ...objectSchema(topology.results, resultSchema), required: [] },
    curves: topology.curves.map(({ id, name, x, y }) => ({
      id,
      name,
      x: { quantity: x.quantity, unit: x.unit },
      y: { quantity: y.quantity, unit: y.unit },
    })),
    warnings: topology.limits.map(({ code, severity, template, unit, source }) => ({
      code,
      severity,
      template,
      unit,
      source,
    })),
    formulas: topology.formulas,
    sources: topology.sources,
    leavesOut: topology.leavesOut,
  };
}

function objectSchema<F>(fields: Readonly<Record<string, F>>, schemaOf: (field: F) => Json): Json {
  const properties = Object.fromEntries(Object.entries(fields).map(([key, field]) => [key, schemaOf(field)]));
  const required = Object.entries(properties).flatMap(([key, schema]) => (schema["default"] === 0 ? [] : [key]));
  return { type: "object", additionalProperties: false, properties, required };
}

function named({ label, symbol, unit, help }: { label: string; symbol: string; unit: string; help?: string }): Json {
  return { title: label, label, symbol, unit, ...(help && { description: help }) };
}

function numberSchema(field: NumberField): Json {
  const [minimum, maximum] = acceptedRange(field);
  return {
    type: "number",
    ...named(field),
    minimum,
    maximum,
    range: { least: field.least, most: field.most },
    ...(field.default !== null && { default: field.default }),
  };
}

function conditionSchema(field: ConditionField): Json {
  if (field.type === "number") return numberSchema(field);
  return {
    type: "string",
    title: field.label,
    label: field.label,
    symbol: field.symbol,
    unit: "",
    enum: field.options.map((option) => option.value),
    default: field.default,
  };
}

function resultSchema(field: ResultField): Json {
  const schema = { type: "number", ...named(field), formula: field.formula };
  return field.list ? { ...schema, type: "array", items: { type: "number" } } : schema;
}

const record = z.record(z.string(), z.unknown());

/** The answer's own shape, for the description of the interface. */
export const kindAnswer = z.object({
  slug: z.string(),
  name: z.string(),
  summary: z.string(),
  place: z.string(),
  ports: z.array(record),
  topologies: z.array(
    z.object({
      slug: z.string(),
      name: z.string(),
      summary: z.string(),
      targets: record,
      parts: record,
      conditions: record,
      results: record,
      curves: z.array(record),
      warnings: z.array(record),
      formulas: z.array(record),
      sources: z.array(record),
      leavesOut: z.array(z.string()),
    }),
  ),
});
