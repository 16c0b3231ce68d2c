import { deviceClasses, packageName } from "../device/classes.ts";
import { completeFields, type PlainConditions } from "../stage/defaults.ts";
import type { Draw } from "../stage/draw.ts";
import type { ConditionValues } from "../stage/values.ts";
import type { ComputedChain } from "./compute.ts";
import { voiceConditions } from "./conditions.ts";
import { droopOf, type Droop } from "./droop.ts";
import { byPackage, partsList } from "./partsList.ts";

/** One entry of a supply budget. */
export interface BudgetEntry {
  label: string;
  /** Id of the stage; absent for what belongs to the whole voice. */
  stage?: string;
  /** A from each rail, counted positive. */
  positive: { typical: number; most: number };
  negative: { typical: number; most: number };
}

/** One rail's current. */
export interface RailBudget {
  /** A. */
  typical: number;
  most: number;
  /** Least and most that the meter should show at first power-up. */
  windowLow: number;
  windowHigh: number;
  /** V lost in the series element at the typical current. */
  drop: number;
  /** V left behind it, without its sign. */
  left: number;
}

export interface SupplyBudget {
  entries: BudgetEntry[];
  positive: RailBudget;
  negative: RailBudget;
  /** A, typical: positive less negative; what goes to ground. */
  difference: number;
  /** A to set the bench supply's current limit to. */
  limit: number;
  /** W, typical. */
  power: number;
  /** Hz: corner of series resistor and bulk capacitor; absent without a resistor. */
  corner?: number;
  droop: Droop;
}

export type SupplyConditions = ConditionValues<typeof voiceConditions>;

/** The conditions of a voice, complete. */
export const supplyConditions = (given: PlainConditions): SupplyConditions =>
  completeFields(voiceConditions, given) as unknown as SupplyConditions;

/** First-power window: from 0.6 of the typical to 1.1 of the most; limit at twice the most. Common practice. */
const [windowLow, windowHigh, limitShare] = [0.6, 1.1, 2];
/** V across a Schottky diode: 0.3 to 0.45. From memory. */
const schottkyDrop = 0.35;
/** Lamps differ by half from what is planned. From memory. */
const groundSpread = 1.5;

/** What a voice draws: every device at rest, bias currents, loads to ground, and what charges its envelopes. */
export function supplyOf(computed: ComputedChain): SupplyBudget {
  const { chain, stages } = computed;
  const found = (id: string) => stages.get(id)?.found;
  const known = chain.stages.filter(({ id }) => found(id));
  const list = partsList(known, (kind, topology) => {
    const stage = known.find((one) => one.kind === kind && one.topology === topology);
    return stage && found(stage.id);
  });
  const draws = [...stages].flatMap(
    ([
      id,
      {
        found: { topology },
        ...stage
      },
    ]) =>
      (topology.draws?.({ ...stage, parts: stage.stage.parts, results: stage.analysis.results }) ?? []).map((draw) => ({
        ...{ id, name: stage.stage.name, draw },
      })),
  );
  const conditions = supplyConditions(chain.conditions);
  const entries: BudgetEntry[] = [
    ...byPackage(list).flatMap(packageEntry),
    ...draws.flatMap(({ id, name, draw }) => drawEntry(id, name, draw)),
    ...(conditions.groundLoads > 0 ? [groundEntry(conditions.groundLoads)] : []),
  ];
  return budgetOf(
    entries,
    draws.flatMap(({ draw }) => draw.pulse ?? []),
    conditions,
  );
}

/** The budget of entries that are known one by one. */
export function budgetOf(
  entries: BudgetEntry[],
  pulses: readonly NonNullable<Draw["pulse"]>[],
  conditions: SupplyConditions,
): SupplyBudget {
  const sum = (rail: "positive" | "negative", how: "typical" | "most") =>
    entries.reduce((total, entry) => total + entry[rail][how], 0);
  const { seriesElement, bulkCapacitance } = conditions;
  const diode = seriesElement.startsWith("schottky") ? schottkyDrop : 0;
  const resistance = seriesElement.endsWith("resistor") ? conditions.seriesResistance : 0;
  const rail = (side: "positive" | "negative", volts: number): RailBudget => {
    const [typical, most] = [sum(side, "typical"), sum(side, "most")];
    const drop = diode + typical * resistance;
    return {
      ...{ typical, most, drop, left: volts - drop },
      ...{ windowLow: windowLow * typical, windowHigh: windowHigh * most },
    };
  };
  const positive = rail("positive", conditions.railPositive);
  const negative = rail("negative", -conditions.railNegative);
  return {
    ...{ entries, positive, negative, difference: positive.typical - negative.typical },
    limit: limitShare * Math.max(positive.most, negative.most),
    power: positive.typical * conditions.railPositive - negative.typical * conditions.railNegative,
    ...(resistance > 0 && { corner: 1 / (2 * Math.PI * resistance * bulkCapacitance) }),
    droop: droopOf(pulses, resistance, bulkCapacitance),
  };
}

function packageEntry({ type, quantity }: { type: string; quantity: number }): BudgetEntry[] {
  const found = Object.entries(deviceClasses).find(
    ([name]) => packageName(name as keyof typeof deviceClasses) === type,
  );
  const quiescent = found?.[1].quiescent;
  if (!quiescent) return [];
  // Halves that nothing uses draw as the others do.
  const count = quantity * found[1].perPackage;
  const both = { typical: count * quiescent.typical, most: count * quiescent.most };
  return [{ label: `${quantity} × ${type}`, positive: both, negative: both }];
}

function drawEntry(stage: string, name: string, draw: Draw): BudgetEntry[] {
  const side = (current: number) => ({ typical: draw.onlyInHits ? 0 : current, most: current });
  if (draw.positive === 0 && draw.negative === 0) return [];
  return [{ label: `${name}: ${draw.label}`, stage, positive: side(draw.positive), negative: side(draw.negative) }];
}

const groundEntry = (current: number): BudgetEntry => ({
  label: "lamps and other loads to ground",
  positive: { typical: current, most: groundSpread * current },
  negative: { typical: 0, most: 0 },
});
