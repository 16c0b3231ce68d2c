import { z } from "zod";

export const checkQuery = z.strictObject({
  revision: z.coerce
    .number()
    .int()
    .min(1)
    .max(999_999_999)
    .optional()
    .meta({ description: "Of this revision; of the working copy where left out" }),
});

const level = z.object({
  node: z.string().meta({ description: "stage.port, with a place behind it for a point inside a stage" }),
  stage: z.string(),
  label: z.string(),
  signal: z.enum(["noise", "sine"]),
  rms: z.number().meta({ description: "V, at the peak of a hit" }),
  peak: z.number().meta({ description: "V: four standard deviations of noise, the crest of a sine" }),
  clip: z.number().optional().meta({ description: "V to either side; absent where nothing limits it" }),
  headroomDb: z.number().optional(),
  floor: z.number().meta({ description: "V RMS between hits" }),
  sign: z.union([z.literal(1), z.literal(-1)]).meta({ description: "Against the wave it goes with most" }),
  origin: z.string().optional().meta({ description: "Id of the stage whose wave that is" }),
  most: z.number().optional().meta({ description: "V RMS that the trade allows there" }),
  jack: z.boolean(),
});

const rail = z.object({
  typical: z.number(),
  most: z.number(),
  windowLow: z.number(),
  windowHigh: z.number(),
  drop: z.number(),
  left: z.number(),
});
const entrySide = z.object({ typical: z.number(), most: z.number() });

const supply = z.object({
  entries: z.array(
    z.object({ label: z.string(), stage: z.string().optional(), positive: entrySide, negative: entrySide }),
  ),
  positive: rail.meta({ description: "A and V; drop and left are V in and behind the series element" }),
  negative: rail,
  difference: z.number().meta({ description: "A to ground, typical" }),
  limit: z.number().meta({ description: "A to set the bench supply to" }),
  power: z.number(),
  corner: z.number().optional().meta({ description: "Hz of series resistor and bulk capacitor" }),
  droop: z.object({ actual: z.number(), limit: z.number(), byCharge: z.number() }),
});

const item = z.object({
  severity: z.enum(["fault", "caution", "note"]),
  stage: z.string().meta({ description: "Id of the stage; empty where it is about the whole voice" }),
  code: z.string(),
  message: z.string(),
  value: z.number().optional(),
  limit: z.number().optional(),
  unit: z.string().optional(),
  fromNeighbours: z.literal(true).optional().meta({ description: "Standing alone, the stage is free of it" }),
  accepted: z.object({ reason: z.string(), by: z.string() }).optional(),
});

export const checkAnswer = z.object({
  voice: z.object({ id: z.string(), name: z.string() }),
  revision: z.union([z.int(), z.literal("working")]),
  levels: z.array(level),
  supply,
  items: z.array(item).meta({ description: "The worst first; what was accepted stays in the list" }),
});

export type CheckAnswer = z.infer<typeof checkAnswer>;
