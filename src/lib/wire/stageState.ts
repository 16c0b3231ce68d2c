import {
  completeConditions,
  defaultParts,
  defaultTargets,
  designExactly,
  isRefusal,
  nearestInSeries,
  seriesBetween,
  solveStage,
  type AnyTopology,
  type ConditionField,
  type NumberField,
  type PartClass,
  type PlainConditions,
  type PlainValues,
  type SeriesName,
  type ValueSeries,
} from "#lib/circuit/index.ts";

/** All that a person sets on a stage sheet; every value is one that can be computed with. */
export interface StageState {
  topology: string;
  targets: PlainValues;
  /** Relative half-widths, only of windows that differ from the usual ones. */
  windows: PlainValues;
  parts: PlainValues;
  /** Complete. */
  conditions: PlainConditions;
  series: SeriesChoice;
}

export type SeriesChoice = Record<"resistor" | "capacitor", SeriesName>;

export const usualSeries: SeriesChoice = { resistor: "E24", capacitor: "E12" };

/** The series that a part of this class steps along. */
export function seriesOf(partClass: PartClass, series: SeriesChoice): ValueSeries {
  return partClass === "pot" ? "pots" : series[partClass];
}

const starts = new WeakMap<AnyTopology, StageState>();

/** The design a calculator opens with: the default targets, and the best values that exist for them. */
export function startingState(topology: AnyTopology): StageState {
  const known = starts.get(topology) ?? start(topology);
  starts.set(topology, known);
  return known;
}

function start(topology: AnyTopology): StageState {
  const targets = defaultTargets(topology);
  const solution = Object.keys(targets).length > 0 ? solveStage(topology, { targets, count: 1 }) : undefined;
  const best = solution && "candidates" in solution ? solution.candidates[0]?.parts : undefined;
  return {
    topology: topology.id,
    targets,
    windows: {},
    parts: best ?? defaultParts(topology),
    conditions: completeConditions(topology),
    series: usualSeries,
  };
}

/** A saved stage as a sheet takes it up: what was not saved stands at its usual value. */
export function stateOfSaved(
  topology: AnyTopology,
  saved: {
    parts: PlainValues;
    conditions?: PlainConditions;
    targets?: PlainValues;
    windows?: PlainValues | undefined;
  },
): StageState {
  return {
    topology: topology.id,
    targets: { ...defaultTargets(topology), ...saved.targets },
    windows: { ...saved.windows },
    parts: { ...defaultParts(topology), ...saved.parts },
    conditions: completeConditions(topology, saved.conditions),
    series: usualSeries,
  };
}

/**
 * Parts a designer decides before the rest is worked out: the anchors, what follows them, and any pot that need not be
 * fitted.
 */
export function decidedParts(topology: AnyTopology, parts: PlainValues): PlainValues {
  const keys = new Set(topology.anchors.flatMap(({ part, follows = [] }) => [part, ...follows]));
  for (const [key, field] of Object.entries(topology.parts)) if (field.default === 0) keys.add(key);
  return Object.fromEntries([...keys].map((key): [string, number] => [key, parts[key]!]));
}

/** Exact parts for a state's targets, each moved to the nearest value that exists; the state's own where there are none. */
export function nearestParts(topology: AnyTopology, state: StageState): PlainValues {
  const decided = decidedParts(topology, state.parts);
  const exact = designExactly(topology, state.targets, state.conditions, decided);
  if (isRefusal(exact)) return state.parts;
  return Object.fromEntries(
    Object.entries(topology.parts).map(([key, field]) => {
      const value = exact[key]!;
      if (!(value > 0) || key in decided) return [key, value];
      return [key, nearestInSeries(value, seriesOf(field.partClass, state.series))[0]!];
    }),
  );
}

/** Surroundings that an ideal world lacks, to be switched on one by one. */
export function isOptional(field: ConditionField): field is NumberField {
  return field.type === "number" && (field.default === null || field.suggestion !== undefined);
}

/** The same conditions with every optional one as in an ideal world, and whether that changes any. */
export function idealConditions(
  topology: AnyTopology,
  conditions: PlainConditions,
): { conditions: PlainConditions; differs: boolean } {
  const optional = Object.entries(topology.conditions).filter(([, field]) => isOptional(field));
  const ideal = Object.fromEntries(optional.map(([key, field]) => [key, field.default]));
  const differs = optional.some(([key, field]) => conditions[key] !== field.default);
  return { conditions: { ...conditions, ...ideal }, differs };
}

/**
 * The starting state with every pot that may be left out fitted after all, small enough to trim with: about a quarter
 * of the largest for which the design still has parts.
 */
export function startingStateWithPots(topology: AnyTopology): StageState {
  let state = startingState(topology);
  for (const [key, field] of Object.entries(topology.parts)) {
    if (field.partClass !== "pot" || field.default !== 0) continue;
    const fitted = (value: number) => ({ ...state, parts: { ...state.parts, [key]: value } });
    const designable = (value: number) => {
      const next = fitted(value);
      return !isRefusal(designExactly(topology, next.targets, next.conditions, decidedParts(topology, next.parts)));
    };
    const largest = seriesBetween("pots", 100, field.most).findLast(designable);
    if (largest === undefined) continue;
    const trimmed = fitted(nearestInSeries(largest / 4, "pots")[0]!);
    state = { ...trimmed, parts: nearestParts(topology, trimmed) };
  }
  return state;
}
