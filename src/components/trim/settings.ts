import { turnedPots, usualKnob, type Knob, type TrimRequest } from "#lib/circuit/analysis/trim/index.ts";
import { formatTyped, parseQuantity, type AnyTopology } from "#lib/circuit/index.ts";
import { toleranceFault, windowFault } from "#lib/wire/spreadFaults.ts";
import type { StageState } from "#lib/wire/stageState.ts";

/** What stands in the panel's fields. */
export interface TrimSettings {
  result: string;
  /** Typed over; undefined follows the targets on the sheet. */
  window: { least: string; most: string } | undefined;
  law: Knob["law"];
  shape: Knob["shape"];
  /** Per cent of the track. */
  end: string;
  /** Per cent. */
  potTolerance: string;
  /** Share of the travel that is wanted, per cent. */
  useful: string;
}

const boards = 500;

export function startingTrim(topology: AnyTopology, state: StageState, telling: readonly string[]): TrimSettings {
  const knob = usualKnob(topology, state.conditions);
  const pot = turnedPots(topology, state.parts)[0]?.pot;
  return {
    result: turnedResults(topology, state, telling)[0] ?? Object.keys(topology.results)[0]!,
    window: undefined,
    law: knob.law,
    shape: knob.shape,
    end: String(100 * knob.endResistance),
    potTolerance: String(100 * (pot === undefined ? 0.2 : topology.parts[pot]!.tolerance)),
    useful: "50",
  };
}

/** Results that follow the knob: those with a target first, then what the kind tells first. */
export function turnedResults(
  topology: AnyTopology,
  { parts, conditions }: StageState,
  telling: readonly string[],
): string[] {
  const at = (rotation: number) => topology.analyse({ parts, conditions: { ...conditions, rotation } as never });
  const [low, high] = [at(0), at(1)];
  const moved = Object.entries(topology.results)
    .filter(([, { list, words }]) => list !== true && words === undefined)
    .map(([name]) => name)
    .filter((name) => {
      const [a, b] = [low[name], high[name]];
      return (
        typeof a === "number" && typeof b === "number" && Math.abs(a - b) > 1e-6 * Math.max(Math.abs(a), Math.abs(b))
      );
    });
  const wanted = new Set(Object.values(topology.targets).map(({ result }) => result));
  const rank = (name: string) => (wanted.has(name) ? 0 : telling.includes(name) ? 1 : 2);
  return moved.sort((a, b) => rank(a) - rank(b));
}

/** The window as it stands in the fields: of the result's own target, or from the least to the most of several. */
export function trimWindow(topology: AnyTopology, state: StageState, { result, window }: TrimSettings) {
  if (window) return window;
  const { unit } = topology.results[result]!;
  const text = (value: number) => formatTyped(value, unit, 5);
  const own = Object.entries(topology.targets).find(([, target]) => target.result === result);
  if (own) {
    const [value, width] = [state.targets[own[0]]!, state.windows[own[0]] ?? own[1].window];
    return { least: text(value * (1 - width)), most: text(value * (1 + width)) };
  }
  const alike = Object.entries(topology.targets)
    .filter(([, target]) => target.unit === unit)
    .map(([key]) => state.targets[key]!);
  if (alike.length < 2) return { least: "", most: "" };
  return { least: text(Math.min(...alike)), most: text(Math.max(...alike)) };
}

export interface ReadTrim {
  request?: TrimRequest;
  /** Share of the travel that is wanted. */
  useful?: number;
  faults: Record<string, string>;
}

export function readTrim(topology: AnyTopology, state: StageState, settings: TrimSettings): ReadTrim {
  const faults: Record<string, string> = {};
  const { unit } = topology.results[settings.result]!;
  const texts = trimWindow(topology, state, settings);
  const [least, most] = [texts.least, texts.most].map((text) => parseQuantity(text, unit));
  if (!least!.ok || !most!.ok) {
    const empty = texts.least.trim() === "" || texts.most.trim() === "";
    const unread = [least, most].find((side) => side?.ok === false);
    faults["window"] = empty
      ? "Say what it must reach: the least and the most."
      : unread?.ok === false
        ? unread.reason
        : "";
  } else {
    const fault = windowFault(least!.value, most!.value, unit);
    if (fault !== undefined) faults["window"] = fault;
  }
  const potTolerance = percentOf(settings.potTolerance);
  const fault = Number.isNaN(potTolerance) ? "Type a tolerance in per cent, such as 20." : toleranceFault(potTolerance);
  if (fault !== undefined) faults["potTolerance"] = fault.replace(/ Leave .*/, "");
  const end = percentOf(settings.end);
  if (!(end >= 0 && end <= 0.2)) faults["end"] = "Type a share of the track in per cent, from 0 to 20.";
  const useful = percentOf(settings.useful);
  if (!(useful >= 0 && useful < 1)) faults["useful"] = "Type a share of the travel in per cent, below 100.";
  if (Object.keys(faults).length > 0 || !least!.ok || !most!.ok) return { faults };
  const tolerances = Object.fromEntries(
    Object.entries(topology.parts).map(([part, field]) => [
      part,
      field.partClass === "pot" ? potTolerance : field.tolerance,
    ]),
  );
  return {
    faults,
    useful,
    request: {
      parts: state.parts,
      conditions: state.conditions,
      tolerances,
      boards,
      seed: 1,
      distribution: "uniform",
      result: settings.result,
      window: { least: least!.value, most: most!.value },
      knob: {
        ...usualKnob(topology, state.conditions),
        law: settings.law,
        shape: settings.shape,
        endResistance: end,
      },
    },
  };
}

function percentOf(text: string): number {
  const plain = text.replace(/%\s*$/, "").trim();
  return /^-?\d+(\.\d+)?$/.test(plain) ? Number(plain) / 100 : Number.NaN;
}
