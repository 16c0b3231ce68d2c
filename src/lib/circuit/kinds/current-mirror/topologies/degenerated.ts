import { saturationVoltage } from "../../../device/bipolar.ts";
import { formatQuantity } from "../../../quantity/format.ts";
import { resistor } from "../../../stage/fields.ts";
import { solveBracketed } from "../../../numeric/solveBracketed.ts";
import { defineTopology, type DesignRefusal, type Limit } from "../../../stage/topology.ts";
import type { PartValues } from "../../../stage/values.ts";
import { mirrorCurves } from "../curves.ts";
import { results, sharedBaseConditions as conditions, targets } from "../fields.ts";
import { mirrorFigures, worldOf, type C, type MirrorShape, type R } from "../figures.ts";
import { degeneratedFormulas } from "../formulas.ts";
import { joints } from "../joints.ts";
import { pairLimits } from "../limits.ts";
import { solvePair, type MirrorWorld } from "../model.ts";
import { sources } from "../sources.ts";
import { pairNetwork } from "./pairNetwork.ts";

const emitterResistor = { least: 0, most: 4.7e3, default: 1e3 };

const parts = {
  r1: resistor({
    ...emitterResistor,
    label: "reference emitter",
    symbol: "R_1",
    help: "From the rail to the reference transistor's emitter.",
  }),
  r2: resistor({
    ...emitterResistor,
    label: "output emitter",
    symbol: "R_2",
    help: "From the rail to the output transistor's emitter; the ratio is near R1/R2.",
  }),
} as const;

function shapeOf({ r1, r2 }: PartValues<typeof parts>, beta: number | null): MirrorShape {
  const emitterShare = 1 + 1 / (beta ?? Infinity);
  return {
    solve: (world) => solvePair(world, r1, r2),
    nominal: r1 > 0 && r2 > 0 ? r1 / r2 : 1,
    compliance: ({ outputCurrent }) => saturationVoltage + outputCurrent * r2 * emitterShare,
    degeneration: ({ baseLine, baseEmitter }) => baseLine - baseEmitter,
    textbook: (world) => textbookResistance(world, r2),
  };
}

/** ro·(1 + gm·(R2 ∥ rπ)) + R2 ∥ rπ, Ω, with the reference current in the output transistor. */
function textbookResistance({ earlyVoltage, referenceCurrent, thermal, beta, supply }: MirrorWorld, r2: number) {
  const transconductance = referenceCurrent / thermal;
  const inner = (earlyVoltage + supply) / referenceCurrent;
  const parallel = 1 / (1 / r2 + transconductance / beta);
  return inner * (1 + transconductance * parallel) + parallel;
}

/** Search bounds of R2, Ω: below, the resistor does nothing; above, no current is left. */
const [leastR2, mostR2] = [1e-3, 1e9];

function design(
  given: number | undefined,
  wanted: number,
  world: MirrorWorld,
): { r1: number; r2: number } | DesignRefusal {
  const r1 = given ?? emitterResistor.default;
  const aim = wanted * world.referenceCurrent;
  const excess = (logR2: number) => Math.log(solvePair(world, r1, Math.exp(logR2)).outputCurrent / aim);
  const largest = solvePair(world, r1, leastR2).outputCurrent / world.referenceCurrent;
  if (largest <= wanted || solvePair(world, r1, mostR2).outputCurrent >= aim)
    return {
      refused: true,
      field: "ratio",
      message: `With ${formatQuantity(r1, "Ω")} in the reference's emitter the ratio reaches ${formatQuantity(largest, "")} at most. Ask for less, or take a larger R_1.`,
    };
  return { r1, r2: Math.exp(solveBracketed(excess, Math.log(leastR2), Math.log(mostR2))) };
}

const limits: readonly Limit<typeof parts, C, R>[] = pairLimits;

export const degenerated = defineTopology({
  id: "degenerated",
  name: "Degenerated",
  summary: "A resistor in each emitter swamps mismatch and Early effect, and sets the ratio.",
  parts,
  conditions,
  targets,
  results,
  analyse: ({ parts: values, conditions: given }) => mirrorFigures(worldOf(given), shapeOf(values, given.beta)),
  design: ({ targets: { ratio }, conditions: given, given: decided }) => design(decided.r1, ratio, worldOf(given)),
  anchors: [{ part: "r1", least: 100, most: 4.7e3 }],
  curves: mirrorCurves<typeof parts>((state) => shapeOf(state.parts, state.conditions.beta)),
  limits,
  formulas: degeneratedFormulas,
  sources,
  network: pairNetwork(true),
  joints,
  devices: [
    { key: "q1", letter: "Q", label: "reference transistor", deviceClass: "general-purpose PNP" },
    { key: "q2", letter: "Q", label: "output transistor", deviceClass: "general-purpose PNP" },
  ],
  traits: [
    { label: "Transistors", text: "2, and one for each further output" },
    { label: "Base-current error", text: "2/β" },
    { label: "Early effect", text: "small at the peak, full at the tail" },
    { label: "Mismatch", text: "divided by 1 + I·R/V_T" },
    { label: "Voltage needed", text: "0.2 V and the drop of R2" },
    { label: "Ratio set by", text: "R_1/R_2, where I·R is far above V_T" },
  ],
  leavesOut: [
    "series resistance of base and emitter",
    "change of β with current",
    "charge storage: the mirror is far faster than any envelope",
    "tolerance of the resistors: their ratio passes on in full",
  ],
});
