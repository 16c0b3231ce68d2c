export { reviewChecklist, type CheckItem, type CheckState, type Reviewed } from "./checklist.ts";
export {
  compareVoices,
  type ChangedStage,
  type Comparison,
  type ComparedSide,
  type CompareOptions,
  type StageName,
} from "./compareVoices.ts";
export type { CurvePair } from "./curves.ts";
export type { LevelChange } from "./levels.ts";
export type { SupplyChange } from "./supply.ts";
export type { QuantityChange } from "./quantities.ts";
export { recompute, type FigureDifference, type Recomputation } from "./recompute.ts";
export type { ResultChange, Verdict } from "./results.ts";
export type { Change, PartChange, SettingChange } from "./values.ts";
export type { WarningChanges } from "./warnings.ts";
