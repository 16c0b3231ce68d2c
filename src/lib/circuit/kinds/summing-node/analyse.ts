import { magnitudeAt } from "../../network/transfer.ts";
import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../stage/topology.ts";
import type { PartValues, ResultValues, State } from "../../stage/values.ts";
import { paths, type conditions, type parts, type Path, type results, type targets } from "./fields.ts";
import { bandwidthOf, noiseGain, passiveGains, sumRms, transferOf, type Sum } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type SumState = State<P, C>;

/** Taken where the designer has not chosen one. */
const usualFeedback = 22e3;

export interface FittedPath {
  path: Path;
  /** Ω, with its source. */
  resistance: number;
  /** V RMS, or null where nothing is said. */
  level: number | null;
  /** +1 for an even number of inversions. */
  sign: 1 | -1;
}

export function fittedPaths({ parts, conditions }: SumState): FittedPath[] {
  return paths
    .filter((path) => parts[`r${path}`] > 0)
    .map((path) => ({
      path,
      resistance: parts[`r${path}`] + conditions[`source${path}`]!,
      level: conditions[`level${path}`],
      sign: conditions[`parity${path}`] === "even" ? 1 : -1,
    }));
}

export function sumOf(state: SumState): Sum {
  const { gainBandwidth, openLoopGain } = state.conditions;
  const resistances = fittedPaths(state).map(({ resistance }) => resistance);
  return { resistances, rf: state.parts.rf, cf: state.parts.cf, gainBandwidth, openLoopGain };
}

export function analyse(state: SumState): ResultValues<R> {
  const { conditions } = state;
  const fitted = fittedPaths(state);
  const sum = sumOf(state);
  const transfers = fitted.map(({ resistance }) => transferOf(sum, resistance));
  const gains = transfers.map((transfer) => magnitudeAt(transfer, 0));
  const gainOf = (path: Path) => gains[fitted.findIndex((one) => one.path === path)];
  const [gain1, gain2] = [gainOf(1), gainOf(2)];
  const bandwidth = transfers[0] && bandwidthOf(transfers[0]);
  return {
    gains,
    ...(gain1 !== undefined && { gain1 }),
    ...(gain2 !== undefined && { gain2 }),
    inverting: 1,
    noiseGain: noiseGain(sum),
    ...(bandwidth !== undefined && { bandwidth }),
    outputOffset: Math.abs(conditions.offsetVoltage) * noiseGain(sum),
    ...levels(fitted, gains, conditions.correlation),
    passiveGains: passiveGains(sum.resistances, conditions.loadResistance),
  };
}

/** Levels at the output, where at least one path says its own. */
function levels(fitted: readonly FittedPath[], gains: readonly number[], correlation: number): ResultValues<R> {
  const playing = fitted.flatMap(({ level, sign }, k) => (level === null ? [] : [{ level: level * gains[k]!, sign }]));
  if (playing.length === 0) return {};
  const sizes = playing.map(({ level }) => level);
  const loudest = sizes.indexOf(Math.max(...sizes));
  const alike = sizes.map(() => 1);
  const against = sizes.map((_, k) => (k === loudest ? -1 : 1));
  const adding = sumRms(sizes, alike, correlation);
  const opposing = sumRms(sizes, against, correlation);
  return {
    outputRms: sumRms(
      sizes,
      playing.map(({ sign }) => sign),
      correlation,
    ),
    outputRmsInPhase: sumRms(sizes, alike, 1),
    outputRmsIndependent: sumRms(sizes, alike, 0),
    outputRmsOpposed: sumRms(sizes, against, 1),
    // Paths that cancel altogether have no finite cost.
    ...(playing.length > 1 && opposing > 1e-9 * adding && { parityCost: 20 * Math.log10(adding / opposing) }),
  };
}

/** The first two resistors for their gains; the others stay as given. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const rf = given.rf ?? usualFeedback;
  const others = Object.fromEntries(
    paths.filter((path) => path > 2).map((path) => [`r${path}`, given[`r${path}`] ?? 0]),
  ) as Record<`r${3 | 4 | 5 | 6 | 7 | 8}`, number>;
  const r1 = rf / targets.gain1 - conditions.source1!;
  const r2 = rf / targets.gain2 - conditions.source2!;
  if (r1 <= 0 || r2 <= 0) {
    const path = r1 <= 0 ? 1 : 2;
    return {
      refused: true,
      field: `gain${path}`,
      message: `The source of path ${path} alone is more than the ${formatQuantity(rf / targets[`gain${path}`], "Ω")} that this gain leaves. Take a larger feedback resistor, or ask for less gain.`,
    };
  }
  return { r1, r2, ...others, rf, cf: given.cf ?? 0 };
}
