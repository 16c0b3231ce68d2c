import { z } from "zod";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { topologySchemas } from "./calculator.ts";
import { designatorFault } from "./designator.ts";
import { faultText } from "./faultText.ts";
import { longestStageName, stageNameFault } from "./stageName.ts";

const word = z.string().min(1).max(60);
const values = z.record(z.string(), z.union([z.number(), z.string().max(40), z.null()]));

/** A stage as it is sent, before its kind's own descriptors have been asked. */
const looseStage = z.strictObject({
  id: word.meta({ description: "Chosen by the sender; unique in the voice" }),
  kind: word,
  topology: word,
  name: z
    .string()
    .trim()
    .refine((text) => stageNameFault(text) === undefined, { error: ({ input }) => stageNameFault(String(input)) })
    .meta({ minLength: 1, maxLength: longestStageName }),
  parts: values.meta({ description: "By role" }),
  conditions: values.default({}),
  targets: values.default({}),
  windows: values.optional().meta({ description: "Relative half-widths of the target windows" }),
  designators: z
    .record(z.string(), z.string().max(12))
    .default({})
    .meta({ description: "Reference designators by role: R14, C8, RV3" }),
  apart: z
    .boolean()
    .optional()
    .meta({ description: "Keeps its own conditions whatever it is linked to, to see its ideal self" }),
  notFitted: z
    .array(word)
    .max(60)
    .optional()
    .meta({ description: "Roles of parts and devices that stay on the drawing and off the board" }),
});

export interface Stage {
  id: string;
  kind: string;
  topology: string;
  name: string;
  parts: Record<string, number>;
  conditions: Record<string, number | string | null>;
  targets: Record<string, number>;
  windows?: Record<string, number> | undefined;
  designators: Record<string, string>;
  apart?: boolean | undefined;
  notFitted?: string[] | undefined;
}

type Loose = z.output<typeof looseStage>;
type Context = z.core.$RefinementCtx<Loose>;

/** One stage of a saved voice, checked by the descriptors of its kind and topology; figures may be written 4k7 and come out as numbers. */
export const stageSchema: z.ZodType<Stage, z.input<typeof looseStage>> = looseStage.transform((stage, context) => {
  const kind = stageKinds.find(({ id }) => id === stage.kind);
  if (!kind)
    return fail(
      context,
      ["kind"],
      `There is no stage kind “${stage.kind}”. Known: ${stageKinds.map(({ id }) => id).join(", ")}.`,
    );
  const topology = kind.topologies.find(({ id }) => id === stage.topology);
  if (!topology) {
    return fail(
      context,
      ["topology"],
      `A ${kind.name.toLowerCase()} has no topology “${stage.topology}”. Known: ${kind.topologies.map(({ id }) => id).join(", ")}.`,
    );
  }
  const schemas = topologySchemas(topology);
  const checked = {
    parts: check(context, "parts", schemas.parts, stage.parts),
    conditions: check(context, "conditions", schemas.conditions, stage.conditions),
    targets: check(context, "targets", schemas.someTargets, stage.targets),
    ...(stage.windows && { windows: check(context, "windows", schemas.windows, stage.windows) }),
  };
  checkDesignators(context, topology, stage.designators);
  stage.notFitted?.forEach((key, index) => {
    if (key in topology.parts || topology.devices.some((device) => device.key === key)) return;
    fail(context, ["notFitted", index], "There is no such part in this topology.");
  });
  return { ...stage, ...checked } as Stage;
});

function check<T>(context: Context, place: string, schema: z.ZodType<T>, value: unknown): T | undefined {
  const parsed = schema.safeParse(value, { error: faultText });
  if (parsed.success) return parsed.data;
  for (const issue of parsed.error.issues)
    context.issues.push({ ...issue, path: [place, ...issue.path], input: value } as never);
  return undefined;
}

function checkDesignators(context: Context, topology: AnyTopology, designators: Record<string, string>): void {
  for (const [part, designator] of Object.entries(designators)) {
    const fault = designatorFault(topology, part, designator);
    if (fault !== undefined) fail(context, ["designators", part], fault);
  }
}

function fail(context: Context, path: (string | number)[], message: string): never {
  context.issues.push({ code: "custom", path, message, input: undefined });
  return z.NEVER;
}
