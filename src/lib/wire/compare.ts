import { z } from "zod";
import { asFormat, person } from "./page.ts";
import { revisionStatus, stageWarningAnswer } from "./revision.ts";
import { linkSchema } from "./workingCopy.ts";

/** A revision by its number, the working copy, or nothing at all: against nothing, everything is new. */
const sideSchema = z
  .union([z.literal("working"), z.literal("nothing"), z.coerce.number().int().min(1).max(999_999_999)])
  .meta({ description: "Number of a revision, `working`, or `nothing`" });

export type SideRef = z.output<typeof sideSchema>;

export const compareQuery = z.strictObject({
  from: sideSchema
    .optional()
    .meta({ description: "The older side; the release before `to` where left out, or nothing if there is none" }),
  to: sideSchema.default("working"),
  fromVoice: z
    .string()
    .max(60)
    .optional()
    .meta({ description: "Id of another voice of the team that the older side is of" }),
  stage: z
    .string()
    .max(60)
    .optional()
    .meta({ description: "Only curves of this stage, and all of them; those that differ where left out" }),
  curves: z.enum(["changed", "none"]).default("changed"),
  format: asFormat,
});

export type CompareQuery = z.output<typeof compareQuery>;

const sideAnswer = z.object({
  voice: z.object({ id: z.string(), name: z.string() }),
  revision: z.union([z.int(), z.literal("working"), z.literal("nothing")]),
  status: revisionStatus.optional(),
  reason: z.string().optional(),
  preparedBy: person.optional(),
  createdAt: z.iso.datetime().optional(),
  libraryVersion: z.string(),
});

const stageName = z.object({ stage: z.string(), name: z.string(), kind: z.string(), topology: z.string() });
const figure = z.number().optional();
const resultFigure = z.union([z.number(), z.array(z.number())]).optional();
const setting = z.union([z.number(), z.string()]).optional();
const change = z.number().optional().meta({ description: "Relative to the old figure: 0.05 is 5 % more" });
const targetState = z.enum(["within", "close", "outside"]);

const settingChange = z.object({
  stage: z.string().meta({ description: "Id of the stage; empty where it holds for the whole voice" }),
  name: z.string(),
  label: z.string(),
  unit: z.string(),
  from: setting,
  to: setting,
  change,
  byNeighbour: z.literal(true).optional().meta({ description: "Nobody set it: a stage that is linked to it did" }),
});

const axis = z.object({
  quantity: z.string(),
  unit: z.string(),
  scale: z.enum(["linear", "logarithmic"]),
  shown: z
    .object({ unit: z.string(), factor: z.number() })
    .optional()
    .meta({ description: "How a person reads it: a rotation of 0 to 1 as degrees" }),
});

const levelSide = z.object({ rms: z.number(), peak: z.number(), headroomDb: z.number().optional() });
const railChange = z.object({
  from: z.number(),
  to: z.number(),
  windowLow: z.number().meta({ description: "Of the older side's first-power window" }),
  windowHigh: z.number(),
});

export const compareAnswer = z.object({
  from: sideAnswer,
  to: sideAnswer,
  stages: z.object({
    added: z.array(stageName),
    removed: z.array(stageName),
    changed: z.array(
      stageName.extend({
        nameBefore: z.string().optional(),
        topologyBefore: z.string().optional(),
        parts: z.int(),
        targets: z.int(),
        conditions: z.int(),
        results: z.int(),
      }),
    ),
    unchanged: z.int(),
  }),
  parts: z.array(
    z.object({
      designator: z.string(),
      designatorBefore: z.string().optional().meta({ description: "Where the part was renumbered" }),
      stage: z.string(),
      part: z.string(),
      label: z.string(),
      partClass: z.enum(["resistor", "capacitor", "pot"]),
      unit: z.string(),
      from: figure.meta({ description: "Absent where the part is new" }),
      to: figure.meta({ description: "Absent where the part is gone" }),
      change,
    }),
  ),
  targets: z.array(settingChange),
  conditions: z.array(settingChange),
  results: z.array(
    z.object({
      stage: z.string(),
      name: z.string(),
      label: z.string(),
      unit: z.string(),
      from: resultFigure,
      to: resultFigure,
      change,
      verdict: z
        .enum(["better", "worse", "held", "no target"])
        .meta({ description: "Against the window that now holds" }),
      states: z.object({ from: targetState, to: targetState }).optional(),
    }),
  ),
  warnings: z.object({ gone: z.array(stageWarningAnswer), new: z.array(stageWarningAnswer) }),
  links: z.object({ added: z.array(linkSchema), removed: z.array(linkSchema) }),
  quantities: z
    .array(
      z.object({
        partClass: z.enum(["resistor", "capacitor", "pot"]),
        value: z.number(),
        unit: z.string(),
        from: z.int(),
        to: z.int(),
        newUnique: z.boolean().meta({ description: "Now fitted once on the whole board, and not before" }),
      }),
    )
    .meta({ description: "Lines of the parts list whose quantity differs" }),
  levels: z
    .array(
      z.object({
        node: z.string(),
        stage: z.string(),
        label: z.string(),
        from: levelSide.optional(),
        to: levelSide.optional(),
      }),
    )
    .meta({ description: "Points of the chain whose level differs" }),
  supply: z
    .object({ positive: railChange, negative: railChange })
    .optional()
    .meta({ description: "Typical current of each rail, A; absent where a side has none" }),
  curves: z.array(
    z.object({
      stage: z.string(),
      id: z.string(),
      name: z.string(),
      xAxis: axis,
      yAxis: axis,
      x: z.array(z.number()),
      from: z.array(z.number()),
      to: z.array(z.number()),
      difference: z.array(z.number()).meta({ description: "New less old" }),
      differenceUnit: z.string(),
      relative: z.boolean().meta({ description: "Whether the difference is relative to the old: 0.05 is 5 %" }),
    }),
  ),
  checklist: z.array(
    z.object({
      id: z.string(),
      state: z.enum(["checked", "look", "open", "by hand"]),
      title: z.string(),
      details: z.array(z.string()),
    }),
  ),
});

export type CompareAnswer = z.output<typeof compareAnswer>;
