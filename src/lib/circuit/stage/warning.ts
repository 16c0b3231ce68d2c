import type { Unit } from "../quantity/units.ts";

export type Severity = "note" | "caution" | "fault";

/** What a stage has to say about its own figures. */
export interface Warning {
  /** Stable; tests and links rely on it. */
  code: string;
  severity: Severity;
  /** For the reader, with figure and limit. */
  message: string;
  value: number;
  limit: number;
  unit: Unit;
}
