import type { Analysis } from "../stage/analyse.ts";
import type { StageKind } from "../stage/kind.ts";
import type { TargetState } from "../stage/targets.ts";
import type { Warning } from "../stage/warning.ts";
import { findIn } from "./chain.ts";
import { computeChain } from "./compute.ts";
import type { VoiceDocument } from "./document.ts";

export type StageWarning = Warning & { stage: string };

/** What the library says of every stage of a voice, by the id of the stage. */
export interface VoiceAnalysis {
  results: Record<string, Analysis["results"]>;
  /** How each given target is met. */
  states: Record<string, Record<string, TargetState>>;
  warnings: StageWarning[];
}

/**
 * Analyses every stage of a voice under what its neighbours decide. One whose network this version does not know has no
 * figures, and a fault says so.
 */
export function analyseStages(document: VoiceDocument, kinds: readonly StageKind[]): VoiceAnalysis {
  const computed = computeChain(document, findIn(kinds));
  const analysis: VoiceAnalysis = { results: {}, states: {}, warnings: [] };
  for (const { id } of document.stages) {
    const found = computed.stages.get(id)?.analysis;
    if (!found) {
      analysis.warnings.push(unknownNetwork(id));
      continue;
    }
    analysis.results[id] = found.results;
    analysis.states[id] = found.state;
    analysis.warnings.push(...found.warnings.map((warning) => ({ stage: id, ...warning })));
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
