import {
  analyseStage,
  completeConditions,
  defaultParts,
  type Analysis,
  type AnalysisRequest,
  type AnyTopology,
  type PlainConditions,
  type PlainValues,
} from "#lib/circuit/index.ts";

/** What is changed from the stage a topology starts with. */
export interface Change {
  parts?: PlainValues;
  conditions?: PlainConditions;
  targets?: PlainValues;
  windows?: PlainValues;
}

/**
 * One limit shown from both sides. Kinds keep theirs in `tests/kinds/<kind>/limitCases.ts`; the conformance suite finds
 * the file by the folder's name and fails for a limit that no case raises.
 */
export interface LimitCase {
  topology: string;
  code: string;
  /** Enough to raise it… */
  raised: Change;
  /** …and near by, not enough. */
  quiet: Change;
}

export function requestOf(topology: AnyTopology, change: Change = {}): AnalysisRequest {
  return {
    ...change,
    parts: { ...defaultParts(topology), ...change.parts },
    conditions: completeConditions(topology, change.conditions),
  };
}

export const analyseChange = (topology: AnyTopology, change: Change = {}): Analysis =>
  analyseStage(topology, requestOf(topology, change));

export const codesOf = ({ warnings }: Analysis): string[] => warnings.map(({ code }) => code);
