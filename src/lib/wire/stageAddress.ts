import { seriesNames, type AnyTopology, type SeriesName } from "#lib/circuit/index.ts";
import { figureText, partText, readFigure, readWindow, windowText } from "./figureText.ts";
import { nearestParts, startingState, usualSeries, type StageState } from "./stageState.ts";

/**
 * A stage sheet as a query string that a person can read: ?t=multiple-feedback&centreFrequency=1k&ra=22k. Targets and
 * parts are all written, since a link must keep its figures when a default changes; of conditions and windows only
 * those that differ from the usual.
 */
export function writeAddress(topology: AnyTopology, state: StageState): string {
  const names = namesOf(topology);
  const query = new URLSearchParams({ t: topology.id });
  for (const [key, field] of Object.entries(topology.targets)) {
    query.set(names.targets[key]!, plain(figureText(state.targets[key]!, field.unit)));
    const width = state.windows[key];
    if (width !== undefined && width !== field.window) query.set(`w.${names.targets[key]!}`, windowText(width));
  }
  for (const [key, field] of Object.entries(topology.parts)) {
    query.set(names.parts[key]!, plain(partText(state.parts[key]!, field.unit)));
  }
  for (const [key, field] of Object.entries(topology.conditions)) {
    const value = state.conditions[key];
    if (value === undefined || value === field.default) continue;
    if (value === null) continue;
    const text = field.type === "number" && typeof value === "number" ? figureText(value, field.unit) : String(value);
    query.set(names.conditions[key]!, plain(text));
  }
  if (state.series.resistor !== usualSeries.resistor) query.set("resistors", state.series.resistor);
  if (state.series.capacitor !== usualSeries.capacitor) query.set("capacitors", state.series.capacitor);
  return query.toString();
}

export interface AddressReading {
  topology: AnyTopology;
  state: StageState;
  /** What the link held that could not be taken, in words; the usual value stands in its place. */
  faults: string[];
}

/** Reads a query string. Whatever it holds, a state comes out that can be computed with. */
export function readAddress(topologies: readonly AnyTopology[], query: URLSearchParams): AddressReading {
  const faults: string[] = [];
  const asked = query.get("t");
  const found = topologies.find(({ id }) => id === asked);
  const topology = found ?? topologies[0]!;
  if (asked !== null && !found) {
    faults.push(`There is no topology “${shortened(asked)}” here; what stands here is ${topology.name}.`);
  }
  const start = startingState(topology);
  const state: StageState = {
    ...start,
    targets: { ...start.targets },
    windows: {},
    parts: { ...start.parts },
    conditions: { ...start.conditions },
  };
  const names = namesOf(topology);
  const known = new Set(["t", "resistors", "capacitors"]);
  const take = (name: string, read: (text: string) => string | undefined) => {
    known.add(name);
    const text = query.get(name);
    if (text === null) return false;
    const fault = read(text);
    if (fault !== undefined) faults.push(fault);
    return fault === undefined;
  };

  let anyTarget = false;
  for (const [key, field] of Object.entries(topology.targets)) {
    const name = names.targets[key]!;
    const took = take(name, (text) => put(readFigure(text, field), state.targets, key, field.label));
    anyTarget ||= took;
    take(`w.${name}`, (text) => put(readWindow(text), state.windows, key, `${field.label}, window`));
  }
  let anyPart = false;
  for (const [key, field] of Object.entries(topology.parts)) {
    const label = `${field.symbol.replace("_", "")}, ${field.label}`;
    const took = take(names.parts[key]!, (text) => put(readFigure(text, field), state.parts, key, label));
    anyPart ||= took;
  }
  for (const [key, field] of Object.entries(topology.conditions)) {
    take(names.conditions[key]!, (text) => {
      if (field.type === "number") return put(readFigure(text, field), state.conditions, key, field.label);
      if (!field.options.some(({ value }) => value === text)) return unknownOption(field.label, text);
      state.conditions[key] = text;
      return undefined;
    });
  }
  const series = { ...start.series };
  for (const [name, part] of [["resistors", "resistor"] as const, ["capacitors", "capacitor"] as const]) {
    take(name, (text) => {
      if (!(seriesNames as string[]).includes(text)) return unknownOption("Preferred series", text);
      series[part] = text as SeriesName;
      return undefined;
    });
  }
  state.series = series;
  const strangers = [...new Set(query.keys())].filter((name) => !known.has(name));
  if (strangers.length > 0 && (found || asked === null)) {
    faults.push(
      `The link also holds ${strangers.slice(0, 5).map(quoted).join(", ")}, which this calculator does not know.`,
    );
  }
  // Targets alone ask for a design; parts given by hand are never touched.
  if (anyTarget && !anyPart) state.parts = nearestParts(topology, state);
  return { topology, state, faults };
}

function put(
  reading: ReturnType<typeof readFigure>,
  into: Record<string, number | string | null>,
  key: string,
  label: string,
): string | undefined {
  if (!reading.ok) return `${capitalised(label)}: ${reading.message} The usual value stands here instead.`;
  into[key] = reading.value;
  return undefined;
}

const unknownOption = (label: string, text: string) =>
  `${label}: there is no choice ${quoted(text)}. The usual one stands here instead.`;

type Names = Record<"targets" | "parts" | "conditions", Record<string, string>>;

/** Keys are used as they are; one that an earlier group has taken too gets the group's letter in front. */
function namesOf(topology: AnyTopology): Names {
  const taken = new Set(["t", "resistors", "capacitors"]);
  const named = (fields: Readonly<Record<string, unknown>>, letter: string) =>
    Object.fromEntries(
      Object.keys(fields).map((key): [string, string] => {
        const name = taken.has(key) ? `${letter}.${key}` : key;
        taken.add(name);
        return [key, name];
      }),
    );
  return {
    targets: named(topology.targets, "t"),
    parts: named(topology.parts, "p"),
    conditions: named(topology.conditions, "c"),
  };
}

/** Letters that need no escape in an address. */
const plain = (text: string) => text.replace("µ", "u");
const shortened = (text: string) => (text.length > 24 ? `${text.slice(0, 24)}…` : text);
const quoted = (text: string) => `“${shortened(text)}”`;
const capitalised = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
