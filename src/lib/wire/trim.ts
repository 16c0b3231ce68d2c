import { z } from "zod";
import type { TrimTask } from "#lib/circuit/analysis/calculations.ts";
import { turnedPots, usualKnob } from "#lib/circuit/analysis/trim/index.ts";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { parseQuantity } from "#lib/circuit/index.ts";
import { boardFields, checkLots, readBoards } from "./boards.ts";
import { warningAnswer } from "./calculator.ts";
import { figureSchema } from "./figure.ts";
import { windowFault } from "./spreadFaults.ts";
import { yieldAnswer } from "./spread.ts";

const schemas = new WeakMap<AnyTopology, ReturnType<typeof build>>();

/** What the trim of a topology is asked with; read, it is what the library is told. */
export function trimSchema(topology: AnyTopology) {
  const known = schemas.get(topology) ?? build(topology);
  schemas.set(topology, known);
  return known;
}

const mostPots = 64;

const knob = z.strictObject({
  law: z.enum(["linear", "logarithmic", "reverse-logarithmic"]).optional(),
  shape: z.enum(["curve", "two-segment"]).optional(),
  midFraction: z.number().min(0.01).max(0.49).optional(),
  endResistance: z.number().min(0).max(0.2).optional().meta({ description: "Left over at an end, share of the track" }),
  electricalAngle: z.number().min(30).max(3600).optional().meta({ description: "Degrees" }),
});

/** Figures are read once the result, and with it the unit, is known. */
const figure = z.union([z.number(), z.string().max(40)]);

function build(topology: AnyTopology) {
  const plain = Object.keys(topology.results).filter((name) => topology.results[name]!.list !== true);
  return z
    .strictObject({
      ...boardFields(topology),
      result: z.enum(plain as [string, ...string[]]).meta({ description: "What is set with the knob" }),
      window: z.strictObject({ least: figure, most: figure }).meta({ description: "What it must reach" }),
      target: figure
        .optional()
        .meta({ description: "The figure that each board is set to; the middle where left out" }),
      knob: knob.optional().meta({ description: "What is left out is as the conditions say, or usual" }),
      revalue: z
        .strictObject({
          useful: z.number().min(0).lt(1).default(0).meta({ description: "Share of the travel that is wanted" }),
          pots: z.array(figureSchema("Ω")).min(1).max(mostPots).optional(),
        })
        .optional()
        .meta({ description: "Asks for padding and a pot that exist and cover the window at worst case" }),
    })
    .superRefine(({ parts, lots, window, result, target }, context) => {
      checkLots(topology, lots, context);
      if (turnedPots(topology, parts).length === 0)
        context.addIssue({ code: "custom", path: ["parts"], message: potFault(topology) });
      const { unit } = topology.results[result]!;
      const read = Object.entries({ least: window.least, most: window.most, target }).map(([side, sent]) => {
        const parsed = readFigure(sent, unit);
        if (typeof parsed === "object")
          context.addIssue({
            code: "custom",
            path: side === "target" ? [side] : ["window", side],
            message: parsed.fault,
          });
        return typeof parsed === "number" ? parsed : undefined;
      });
      const message = read[0] !== undefined && read[1] !== undefined ? windowFault(read[0], read[1], unit) : undefined;
      if (message !== undefined) context.addIssue({ code: "custom", path: ["window"], message });
    })
    .transform((asked): TrimTask => {
      const { result, window, target, revalue } = asked;
      const { unit } = topology.results[result]!;
      const value = (sent: number | string) => readFigure(sent, unit) as number;
      return {
        ...readBoards(topology, asked),
        result,
        window: { least: value(window.least), most: value(window.most) },
        ...(target !== undefined && { target: value(target) }),
        knob: { ...usualKnob(topology, asked.conditions), ...defined(asked.knob ?? {}) },
        ...(revalue && { revalue: { useful: revalue.useful, ...(revalue.pots && { pots: revalue.pots }) } }),
      };
    });
}

function readFigure(sent: number | string | undefined, unit: Parameters<typeof parseQuantity>[1]) {
  if (sent === undefined || typeof sent === "number") return sent;
  const parsed = parseQuantity(sent, unit);
  return parsed.ok ? parsed.value : { fault: parsed.reason };
}

const defined = <T extends object>(given: T) =>
  Object.fromEntries(Object.entries(given).filter(([, value]) => value !== undefined));

function potFault(topology: AnyTopology): string {
  const pots = Object.keys(topology.parts).filter((part) => topology.parts[part]!.partClass === "pot");
  return pots.length === 0
    ? "This network has no pot to turn."
    : `No pot is fitted. Give ${pots.join(" or ")} a value above zero.`;
}

const range = z.object({ least: z.number(), most: z.number() });
const revalued = z.object({
  parts: z.record(z.string(), z.number()),
  usefulRotation: z.number(),
  worstCaseMargin: z.number(),
});

export const trimAnswer = z.object({
  travel: z.array(z.tuple([z.number(), z.number()])).meta({ description: "Rotation of 0 to 1, result" }),
  usefulRotation: z.number(),
  usefulDegrees: z.number(),
  centre: z.number().optional(),
  slopePerDegree: z.number().optional(),
  sensitivityPerDegree: z.number().optional(),
  ends: z.array(
    z.object({ rotation: z.number(), value: z.number(), extreme: range, warnings: z.array(warningAnswer) }),
  ),
  reach: range.optional().meta({ description: "What every board reaches at some rotation" }),
  worstCaseMargin: z.number().meta({ description: "By which the worst board passes the window; below zero it misses" }),
  coverage: z.object({
    boards: z.int(),
    target: z.number(),
    ofTarget: yieldAnswer,
    ofWindow: yieldAnswer,
    rotations: z.array(z.int()).meta({ description: "Boards by where their knob ends up, in even steps" }),
  }),
  revalue: z
    .object({
      choices: z.array(revalued),
      reached: z.boolean(),
      tried: z.int(),
      wouldTake: z.object({ potTolerance: z.number(), choice: revalued }).optional(),
      says: z.string(),
    })
    .optional(),
});
