import { analyseStage, type Analysis } from "../stage/analyse.ts";
import type { StageKind } from "../stage/kind.ts";
import type { TargetState } from "../stage/targets.ts";
import type { Warning } from "../stage/warning.ts";
import { topologyOf, type VoiceDocument } from "./document.ts";

export type StageWarning = Warning & { stage: string };

/** What the library says of every stage of a voice, by the id of the stage. */
export interface VoiceAnalysis {
  results: Record<string, Analysis["results"]>;
  /** How each given target is met. */
  states: Record<string, Record<string, TargetState>>;
  warnings: StageWarning[];
}

/** Analyses each stage by itself. One whose network this version does not know has no figures, and a fault says so. */
export function analyseStages(document: VoiceDocument, kinds: readonly StageKind[]): VoiceAnalysis {
  const analysis: VoiceAnalysis = { results: {}, states: {}, warnings: [] };
  for (const stage of document.stages) {
    const topology = topologyOf(kinds, stage);
    if (!topology) {
      analysis.warnings.push(unknownNetwork(stage.id));
      continue;
    }
    const { windows, ...rest } = stage;
    const { results, state, warnings } = analyseStage(topology, { ...rest, ...(windows && { windows }) });
    analysis.results[stage.id] = results;
    analysis.states[stage.id] = state;
    analysis.warnings.push(...warnings.map((warning) => ({ stage: stage.id, ...warning })));
  }
  return analysis;
}

const unknownNetwork = (stage: string): StageWarning => ({
  stage,
  code: "unknown-network",
  severity: "fault",
  message: "This version of the library does not know the network of this stage, so it has no figures.",
  value: 0,
  limit: 0,
  unit: "",
});
