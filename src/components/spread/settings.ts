import {
  mostBoards,
  type Distribution,
  type Range,
  type ResultWindows,
  type SpreadRequest,
} from "#lib/circuit/analysis/spread/index.ts";
import {
  formatTyped,
  parseQuantity,
  spacedValues,
  targetWindows,
  type AnyTopology,
  type PartClass,
} from "#lib/circuit/index.ts";
import { partTypes, typesOf } from "#lib/circuit/parts/partTypes.ts";
import { mostSeed } from "#lib/circuit/numeric/counterRandom.ts";
import { toleranceFault, windowFault } from "#lib/wire/spreadFaults.ts";
import type { StageState } from "#lib/wire/stageState.ts";

/** What stands in the panel's fields, as text that may be no figure while it is being typed. */
export interface SpreadSettings {
  result: string;
  /** Windows that were typed over; the others follow the targets on the sheet. */
  windows: Record<string, { least: string; most: string }>;
  boards: string;
  seed: string;
  distribution: Distribution;
  types: Record<string, string>;
  /** Per cent; nothing means exact. */
  tolerances: Record<string, string>;
  lots: Record<PartClass, boolean>;
  temperature: { on: boolean; least: string; most: string };
}

const percentText = (share: number) => String(Number((100 * share).toPrecision(6)));

export function startingSettings(topology: AnyTopology, telling: string): SpreadSettings {
  const parts = Object.entries(topology.parts);
  return {
    result: Object.values(topology.targets)[0]?.result ?? telling,
    windows: {},
    boards: "1000",
    seed: "1",
    distribution: "uniform",
    types: Object.fromEntries(parts.map(([part, { partClass }]) => [part, typesOf(partClass)[0]!.id])),
    tolerances: Object.fromEntries(parts.map(([part, { tolerance }]) => [part, percentText(tolerance)])),
    lots: { resistor: false, capacitor: false, pot: false },
    temperature: { on: false, least: "0", most: "50" },
  };
}

/** Another sort brings its own tolerance. */
export function withType(settings: SpreadSettings, part: string, id: string): SpreadSettings {
  const type = partTypes.find((one) => one.id === id)!;
  return {
    ...settings,
    types: { ...settings.types, [part]: id },
    tolerances: { ...settings.tolerances, [part]: percentText(type.tolerance) },
  };
}

export const withTolerances = (settings: SpreadSettings, shares: Record<string, number>): SpreadSettings => ({
  ...settings,
  tolerances: {
    ...settings.tolerances,
    ...Object.fromEntries(Object.entries(shares).map(([part, share]) => [part, percentText(share)])),
  },
});

/** Least and most of every result that a window may be given for, as they stand in the fields. */
export function windowTexts(topology: AnyTopology, state: StageState, settings: SpreadSettings) {
  const texts: Record<string, { least: string; most: string }> = {};
  const wanted = targetWindows(topology, state.targets, state.windows);
  for (const [key, { least, most }] of Object.entries(wanted)) {
    const { result, unit } = topology.targets[key]!;
    texts[result] ??= { least: formatTyped(least, unit, 5), most: formatTyped(most, unit, 5) };
  }
  if (!(settings.result in texts)) texts[settings.result] = { least: "", most: "" };
  return { ...texts, ...Object.fromEntries(Object.entries(settings.windows).filter(([name]) => name in texts)) };
}

export interface ReadSettings {
  /** Undefined while a field holds something that cannot be computed with. */
  request?: SpreadRequest;
  /** By field. */
  faults: Record<string, string>;
}

/** What the fields ask for, or what is wrong with each. */
export function readSettings(topology: AnyTopology, state: StageState, settings: SpreadSettings): ReadSettings {
  const faults: Record<string, string> = {};
  const window = readWindows(topology, windowTexts(topology, state, settings), faults);
  const tolerances: Record<string, number> = {};
  for (const [part, text] of Object.entries(settings.tolerances)) {
    if (text.trim() === "") continue;
    const share = readNumber(text.replace(/%\s*$/, "")) / 100;
    const fault = Number.isNaN(share) ? "Type a tolerance in per cent, such as 5." : toleranceFault(share);
    if (fault === undefined) tolerances[part] = share;
    else
      faults[`tolerance-${part}`] = Number.isNaN(share)
        ? fault
        : fault.replace("Leave the part out", "Empty the field");
  }
  const boards = readWhole(settings.boards, 1, mostBoards);
  if (boards === undefined) faults["boards"] = `Type a whole number from 1 to ${mostBoards.toLocaleString("en-GB")}.`;
  const seed = readWhole(settings.seed, 0, mostSeed);
  if (seed === undefined) faults["seed"] = `Type a whole number from 0 to ${mostSeed.toLocaleString("en-GB")}.`;
  const temperature = settings.temperature.on ? readTemperature(settings.temperature, faults) : undefined;
  if (Object.keys(faults).length > 0) return { faults };
  const lots = lotsOf(topology, state, settings);
  const curve = topology.curves[0];
  return {
    faults,
    request: {
      parts: state.parts,
      conditions: state.conditions,
      tolerances,
      ...(temperature && { temperature, drifts: driftsOf(settings) }),
      window,
      boards: boards!,
      seed: seed!,
      distribution: settings.distribution,
      ...(lots.length > 0 && { lots }),
      ...(curve !== undefined && { band: bandOf(curve, state) }),
    },
  };
}

/** A band of some per cent is seen near the operating point alone: on a logarithmic axis, so far to either side. */
const closeUp = 2.5;
const bandPoints = 121;

function bandOf(curve: AnyTopology["curves"][number], { parts, conditions }: StageState): SpreadRequest["band"] {
  const drawn = { parts, conditions: conditions as never };
  const [from, to] = curve.domain(drawn);
  const mark = curve.mark?.(drawn)?.x;
  const near = curve.x.scale === "logarithmic" && mark !== undefined && mark > from && mark < to;
  if (!near) return { curve: curve.id };
  const stretch = [Math.max(from, mark / closeUp), Math.min(to, mark * closeUp)] as const;
  return { curve: curve.id, at: spacedValues(curve.x, stretch, bandPoints) };
}

function readWindows(
  topology: AnyTopology,
  texts: ReturnType<typeof windowTexts>,
  faults: Record<string, string>,
): ResultWindows {
  const window: ResultWindows = {};
  for (const [name, { least, most }] of Object.entries(texts)) {
    if (least.trim() === "" && most.trim() === "") continue;
    const { unit } = topology.results[name]!;
    const [low, high] = [least, most].map((text) => (text.trim() === "" ? undefined : parseQuantity(text, unit)));
    const unread = [low, high].find((side) => side?.ok === false);
    const value = (side: typeof low) => (side?.ok ? side.value : undefined);
    const fault = unread?.ok === false ? unread.reason : windowFault(value(low), value(high), unit);
    if (fault !== undefined) faults[`window-${name}`] = fault;
    else
      window[name] = {
        ...(low?.ok && { least: low.value }),
        ...(high?.ok && { most: high.value }),
      };
  }
  return window;
}

const celsiusZero = 273.15;

function readTemperature({ least, most }: SpreadSettings["temperature"], faults: Record<string, string>): Range {
  const range = { least: readNumber(least) + celsiusZero, most: readNumber(most) + celsiusZero };
  if (!(range.least >= 200 && range.most <= 450)) faults["temperature"] = "Type both in °C, between −70 and 175.";
  else if (range.least > range.most) faults["temperature"] = "The lowest must not lie above the highest.";
  return range;
}

function lotsOf(topology: AnyTopology, { parts }: StageState, { lots }: SpreadSettings): string[][] {
  return (["resistor", "capacitor", "pot"] as const)
    .filter((partClass) => lots[partClass])
    .map((partClass) =>
      Object.keys(topology.parts).filter((part) => topology.parts[part]!.partClass === partClass && parts[part]! > 0),
    )
    .filter(({ length }) => length > 1);
}

const driftsOf = ({ types }: SpreadSettings) =>
  Object.fromEntries(
    Object.entries(types).map(([part, id]) => [part, partTypes.find((type) => type.id === id)!.drift]),
  );

function readNumber(text: string): number {
  const plain = text.trim().replace("\u2212", "-");
  return /^[+-]?\d+(\.\d+)?$/.test(plain) ? Number(plain) : Number.NaN;
}

/** A number of people's writing: 10,000 or 10 000 too. */
function readWhole(text: string, least: number, most: number): number | undefined {
  const plain = text.replaceAll(/[,\s\u00a0\u202f]/g, "");
  if (!/^\d{1,10}$/.test(plain)) return undefined;
  const value = Number(plain);
  return value >= least && value <= most ? value : undefined;
}
