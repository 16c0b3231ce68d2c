import type { Analysis } from "../stage/analyse.ts";
import type { PlainConditions } from "../stage/defaults.ts";
import type { StageKind } from "../stage/kind.ts";
import type { TargetState } from "../stage/targets.ts";
import type { Warning } from "../stage/warning.ts";
import { findIn } from "./chain.ts";
import { computeChain } from "./compute.ts";
import { levelsOf, type Level } from "./levels.ts";
import { supplyOf, type SupplyBudget } from "./supply.ts";
import type { VoiceDocument } from "./document.ts";

export type StageWarning = Warning & { stage: string };

/** What the library says of every stage of a voice, by the id of the stage. */
export interface VoiceAnalysis {
  results: Record<string, Analysis["results"]>;
  /** How each given target is met. */
  states: Record<string, Record<string, TargetState>>;
  /** Complete, with what the neighbours and the voice decide. */
  conditions: Record<string, PlainConditions>;
  warnings: StageWarning[];
  /** At each point of the chain; empty in what was kept before levels were computed. */
  levels: Level[];
  /** Absent in what was kept before it was computed. */
  supply?: SupplyBudget;
}

/**
 * Analyses each stage under what its neighbours give it and ask of it. One whose network this version does not know has no
 * figures, and a fault says so.
 */
export function analyseStages(document: VoiceDocument, kinds: readonly StageKind[]): VoiceAnalysis {
  const computed = computeChain(document, findIn(kinds));
  const { stages, unsettled } = computed;
  const analysis: VoiceAnalysis = {
    ...{ results: {}, states: {}, conditions: {}, warnings: [] },
    ...{ levels: levelsOf(computed), supply: supplyOf(computed) },
  };
  for (const { id } of document.stages) {
    const stage = stages.get(id);
    if (!stage) {
      analysis.warnings.push({ ...unknownNetwork, stage: id });
      continue;
    }
    const { results, state, warnings } = stage.analysis;
    analysis.results[id] = results;
    analysis.states[id] = state;
    analysis.conditions[id] = stage.conditions;
    analysis.warnings.push(...warnings.map((warning) => ({ stage: id, ...warning })));
    if (unsettled.includes(id)) analysis.warnings.push({ ...restless, stage: id });
  }
  return analysis;
}

const plain = { severity: "fault", value: 0, limit: 0, unit: "" } as const;

const unknownNetwork: Warning = {
  ...plain,
  code: "unknown-network",
  message: "This version of the library does not know the network of this stage, so it has no figures.",
};

const restless: Warning = {
  ...plain,
  code: "unsettled",
  message:
    "The load and the signal of this stage chase each other without coming to rest, so its figures are not sure.",
};
