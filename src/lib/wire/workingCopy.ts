import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { findIn, linkFaults } from "#lib/circuit/voice/index.ts";
import { z } from "zod";
import { oneLine } from "./plainText.ts";
import { stageSchema, type Stage } from "./stage.ts";

export const mostStages = 500;
const mostLinks = 2000;

const { $schema: _, ...stageShape } = z.toJSONSchema(stageSchema, { io: "input", unrepresentable: "any" });

/** Counted before any is read, so that ten thousand bad ones cost no more than the first; described as if they were read at once. */
const stageList = z
  .array(z.unknown())
  .max(mostStages, `A voice holds at most ${mostStages} stages.`)
  .meta({ items: stageShape })
  .pipe(z.array(stageSchema));

const word = z.string().min(1).max(60);

const linkEnd = z.strictObject({ stage: word, port: word });

export const linkSchema = z.strictObject({ id: word, from: linkEnd, to: linkEnd });

export type Link = z.infer<typeof linkSchema>;

const conditionsSchema = z
  .record(z.string().min(1).max(60), z.union([z.number(), z.string().max(60)]))
  .refine((conditions) => Object.keys(conditions).length <= 100, { error: "At most 100 conditions." })
  .meta({ description: "What holds for the whole voice, such as rails and temperature, in SI units" });

interface Chain {
  stages: readonly Pick<Stage, "id" | "name" | "kind" | "topology" | "designators">[];
  links: readonly Link[];
}

const find = findIn(stageKinds);

type Report = (path: (string | number)[], message: string) => void;

function reportRepeated(ids: readonly string[], at: string, what: string, report: Report) {
  const first = new Map<string, number>();
  ids.forEach((id, index) => {
    const before = first.get(id);
    if (before === undefined) first.set(id, index);
    else report([at, index, "id"], `${what} ${before + 1} has the id ${id} already.`);
  });
}

/** A designator names one part of the board, so it stands once in a voice. */
function reportSharedDesignators({ stages }: Chain, report: Report) {
  const taken = new Map<string, string>();
  stages.forEach((stage, index) => {
    for (const [part, designator] of Object.entries(stage.designators ?? {})) {
      const holder = taken.get(designator);
      const here = `${part} of stage ${index + 1}`;
      if (holder === undefined) taken.set(designator, here);
      else
        report(["stages", index, "designators", part], `${designator} is taken by ${holder}. Choose another number.`);
    }
  });
}

/** A link that could not be soldered: to nothing, between sorts, into a taken input, round in a circle. */
function reportBadLinks({ stages, links }: Chain, report: Report) {
  for (const { index, at, message } of linkFaults(stages, links, find)) report(["links", index, ...at], message);
}

const acceptanceSchema = z.strictObject({
  stage: z.string().max(60).meta({ description: "Id of the stage; empty where it is about the whole voice" }),
  code: word,
  reason: oneLine(200, "Say in one line why it is meant to stay."),
  by: oneLine(120, "Say who accepts it."),
});

const acceptedSchema = z
  .array(acceptanceSchema)
  .max(1000)
  .meta({ description: "What the checks say that was looked at and is meant to stay" });

const format = z.literal(1).meta({ description: "Version of this document's shape" });

/** A voice as it stands on the bench: its stages, what feeds what, and what holds for all of them. */
export const workingCopyDocument = z
  .strictObject({
    format: format.default(1),
    stages: stageList,
    links: z.array(linkSchema).max(mostLinks),
    conditions: conditionsSchema,
    accepted: acceptedSchema.optional(),
    // An answer may be sent back as it came: what the server keeps count of is taken and left aside.
    id: z.string().max(60).optional().meta({ description: "Left aside when sent" }),
    createdAt: z.iso.datetime().optional().meta({ description: "Left aside when sent" }),
    updatedAt: z.iso.datetime().optional().meta({ description: "Left aside when sent" }),
  })
  .superRefine((document, context) => {
    const report: Report = (path, message) => context.addIssue({ code: "custom", path, message, input: document });
    reportRepeated(
      document.stages.map(({ id }) => id),
      "stages",
      "Stage",
      report,
    );
    reportRepeated(
      document.links.map(({ id }) => id),
      "links",
      "Link",
      report,
    );
    reportSharedDesignators(document, report);
    reportBadLinks(document, report);
  });

export const workingCopyAnswer = z.object({
  id: z.string().meta({ description: "Id of the voice" }),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  format,
  stages: z.array(stageSchema),
  links: z.array(linkSchema),
  conditions: conditionsSchema,
  accepted: acceptedSchema.optional(),
});

/** What is stored of a working copy. */
export type WorkingCopyDocument = Pick<
  z.output<typeof workingCopyDocument>,
  "format" | "stages" | "links" | "conditions" | "accepted"
>;

export type WorkingCopyAnswer = z.output<typeof workingCopyAnswer>;
