import { z } from "zod";

export const mostBoards = 100_000;

const revisionNumber = z.coerce.number().int().min(1).max(999_999_999);

export const partsListQuery = z.strictObject({
  boards: z.coerce
    .number()
    .int()
    .min(1)
    .max(mostBoards)
    .default(1)
    .meta({ description: "How many boards the quantities are for" }),
  revision: revisionNumber.optional().meta({ description: "Of this revision; of the working copy where left out" }),
  format: z.enum(["json", "csv"]).optional().meta({ description: "As Accept would say" }),
});

export type PartsListQuery = z.output<typeof partsListQuery>;

const unit = z.enum(["Ω", "F"]);
const listed = {
  designator: z.string().optional().meta({ description: "Absent until one is given" }),
  stage: z.string().meta({ description: "Id of the stage" }),
  stageName: z.string(),
  part: z.string().meta({ description: "Role in the stage" }),
  label: z.string(),
  type: z.string(),
  fitted: z.boolean(),
  quantity: z.int().min(0).meta({ description: "For all boards; 0 where it is not fitted" }),
};
const partClass = z.enum(["resistor", "capacitor", "pot"]);
const place = z.object({ stage: z.string(), part: z.string() });
const bought = { type: z.string(), quantity: z.int().min(0), designators: z.array(z.string()) };

export const partsListAnswer = z.object({
  voice: z.object({ id: z.string(), name: z.string() }),
  revision: z.union([z.int(), z.literal("working")]),
  boards: z.int().min(1),
  parts: z.array(
    z.object({
      ...listed,
      partClass,
      value: z.number().meta({ description: "In SI base units" }),
      unit,
      tolerance: z.number().meta({ description: "Relative: 0.01 is 1 %" }),
    }),
  ),
  devices: z.array(z.object({ ...listed, letter: z.string(), perPackage: z.int().min(1) })),
  unknown: z.array(z.string()).meta({ description: "Ids of stages that this version does not know" }),
  values: z
    .array(z.object({ ...bought, partClass, value: z.number(), unit, tolerance: z.number() }))
    .meta({ description: "Grouped for purchasing" }),
  packages: z
    .array(z.object({ ...bought, spare: z.int().min(0) }))
    .meta({ description: "Devices, by packages to buy; spare ones in them want terminating" }),
  designators: z.object({
    duplicates: z.array(z.object({ designator: z.string(), places: z.array(place) })),
    gaps: z.array(z.string()),
    missing: z.array(place),
  }),
  usedOnce: z
    .array(
      z.object({
        ...place.shape,
        designator: z.string().optional(),
        value: z.number(),
        unit,
        instead: z
          .object({ value: z.number(), designators: z.array(z.string()) })
          .optional()
          .meta({ description: "A value that other parts have and that keeps every target as well met" }),
      }),
    )
    .meta({ description: "Parts that alone have their value" }),
});

export type PartsListAnswer = z.infer<typeof partsListAnswer>;
