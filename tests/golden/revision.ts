import { analyseStage, type AnyTopology, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";

/** A stage as saved, with the figures that the library of its day gave. */
export interface GoldenRevision {
  libraryVersion: string;
  stage: {
    id: string;
    kind: string;
    topology: string;
    name: string;
    parts: PlainValues;
    conditions: PlainConditions;
    targets: PlainValues;
    designators: Record<string, string>;
  };
  results: Record<string, number | readonly number[]>;
  /** Codes of the warnings, in order. */
  warnings: string[];
}

export function recompute(topology: AnyTopology, { parts, conditions, targets }: GoldenRevision["stage"]) {
  const { results, warnings } = analyseStage(topology, { parts, conditions, targets });
  return { results, warnings: warnings.map(({ code }) => code) };
}

/** Far below what any screen shows, and above what a newer JavaScript engine's rounding may move. */
const sameWithin = 1e-10;
/** What rounding leaves where the exact figure is nothing. */
const nothing = 1e-12;

/** The results that are no longer what was saved: moved, gone or new. */
export function differences(was: GoldenRevision["results"], now: GoldenRevision["results"]): string[] {
  const numbers = (value: number | readonly number[] | undefined) => [value ?? []].flat();
  return [...new Set([...Object.keys(was), ...Object.keys(now)])].filter((key) => {
    const [a, b] = [numbers(was[key]), numbers(now[key])];
    return a.length !== b.length || a.some((x, i) => !same(x, b[i]!));
  });
}

function same(was: number, now: number): boolean {
  const apart = Math.abs(now - was);
  return apart <= sameWithin * Math.abs(was) || (Math.min(Math.abs(was), Math.abs(now)) === 0 && apart < nothing);
}
