import type { Severity } from "../../stage/warning.ts";
import type { Unit } from "../../quantity/units.ts";

/** One thing that is not right in a voice, or not yet known to be. */
export interface CheckItem {
  severity: Severity;
  /** Id of the stage; empty where it is about the whole voice. */
  stage: string;
  /** Stable; acceptances and tests rely on it. */
  code: string;
  /** For the reader, with figure and limit. */
  message: string;
  value?: number;
  limit?: number;
  unit?: Unit;
  /** It arises from what the stage is linked to: standing alone, the stage is free of it. */
  fromNeighbours?: true;
}

export type JudgedItem = CheckItem & { accepted?: { reason: string; by: string } };
