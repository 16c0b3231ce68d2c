import { z } from "zod";
import type { SpreadTask } from "#lib/circuit/analysis/calculations.ts";
import type { Range } from "#lib/circuit/analysis/spread/index.ts";
import type { AnyTopology, Unit } from "#lib/circuit/index.ts";
import { boardFields, checkLots, readBoards, someOf } from "./boards.ts";
import { figureSchema } from "./figure.ts";
import { windowFault } from "./spreadFaults.ts";

const schemas = new WeakMap<AnyTopology, ReturnType<typeof build>>();

/** What the spread of a topology is asked with; read, it is what the library is told, tolerances and drifts filled in. */
export function spreadSchema(topology: AnyTopology) {
  const known = schemas.get(topology) ?? build(topology);
  schemas.set(topology, known);
  return known;
}

const mostBandPoints = 1024;

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

function build(topology: AnyTopology) {
  const plain = Object.fromEntries(Object.entries(topology.results).filter(([, field]) => field.list !== true));
  const curves = topology.curves.map(({ id }) => id);
  return z
    .strictObject({
      ...boardFields(topology),
      window: someOf(plain, ({ unit }) => windowOf(unit))
        .optional()
        .meta({ description: "What each result may be for a board to pass" }),
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
      checkLots(topology, lots, context);
      if (wantedYield !== undefined && Object.keys(window ?? {}).length === 0)
        context.addIssue({ code: "custom", path: ["window"], message: "Say what a good board is: give a window." });
    })
    .transform((asked): SpreadTask => {
      const { curve = curves[0], at, window, wantedYield } = asked;
      return {
        ...readBoards(topology, asked),
        ...(window && { window }),
        ...(wantedYield !== undefined && { wantedYield }),
        ...(curve !== undefined && { band: { curve, ...(at && { at }) } }),
      };
    });
}

const range = z.object({ least: z.number(), most: z.number() });
const byResult = <S extends z.ZodType>(schema: S) => z.record(z.string(), schema);
export const yieldAnswer = z.object({
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
