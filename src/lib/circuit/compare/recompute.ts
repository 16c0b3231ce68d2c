import type { StageKind } from "../stage/kind.ts";
import type { Unit } from "../quantity/units.ts";
import { analyseStages, type VoiceAnalysis } from "../voice/analyseStages.ts";
import { topologyOf, type VoiceDocument } from "../voice/document.ts";
import { declaredChanges } from "../version.ts";
import { changedWarnings, type WarningChanges } from "./warnings.ts";

export interface FigureDifference {
  stage: string;
  name: string;
  label: string;
  unit: Unit;
  from?: number | readonly number[];
  to?: number | readonly number[];
  /** Why a later version computes it differently, where that was declared. */
  reason?: string;
}

export interface Recomputation {
  differences: FigureDifference[];
  warnings: WarningChanges;
}

/** Math functions may differ in their last digits from one machine to the next; beyond that a figure has changed. */
const lastDigits = 1e-9;

const near = (a: number, b: number) => Math.abs(a - b) <= lastDigits * Math.max(Math.abs(a), Math.abs(b));

function same(a: number | readonly number[] | undefined, b: number | readonly number[] | undefined): boolean {
  if (typeof a === "number" && typeof b === "number") return near(a, b);
  if (typeof a === "object" && typeof b === "object") return a.length === b.length && a.every((v, i) => near(v, b[i]!));
  return a === b;
}

/** Computes a kept document again with this version of the library, and tells which figures no longer come out as kept. */
export function recompute(document: VoiceDocument, kept: VoiceAnalysis, kinds: readonly StageKind[]): Recomputation {
  const now = analyseStages(document, kinds);
  const differences = document.stages.flatMap((stage) => {
    const topology = topologyOf(kinds, stage);
    const [before, after] = [kept.results[stage.id] ?? {}, now.results[stage.id] ?? {}];
    return [...new Set([...Object.keys(before), ...Object.keys(after)])].flatMap((name): FigureDifference[] => {
      const [from, to] = [before[name], after[name]];
      if (same(from, to)) return [];
      const field = topology?.results[name];
      const reason = declaredChanges.find(
        (change) => change.kind === stage.kind && change.topology === stage.topology && change.result === name,
      )?.reason;
      return [
        {
          ...{ stage: stage.id, name, label: field?.label ?? name, unit: field?.unit ?? "" },
          ...(from === undefined ? {} : { from }),
          ...(to === undefined ? {} : { to }),
          ...(reason === undefined ? {} : { reason }),
        },
      ];
    });
  });
  return { differences, warnings: changedWarnings(kept.warnings, now.warnings) };
}
