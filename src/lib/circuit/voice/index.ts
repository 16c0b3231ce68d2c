/** The voice as a whole. Everything here is given the kinds; the registry is never reached for. */
export * from "./chain.ts";
export { linkFaults, signalOrder, sortWords, type LinkFault } from "./graph.ts";
export { computeChain, type ComputedChain, type ComputedStage } from "./compute.ts";
export { sharedConditions, voiceConditions } from "./conditions.ts";
export { designate, designatorFaults, type DesignatorFaults } from "./designate.ts";
export {
  byPackage,
  byValue,
  partsList,
  type ListedDevice,
  type ListedPart,
  type PackageGroup,
  type PartsList,
  type ValueGroup,
} from "./partsList.ts";
export { shareHints, type ShareHint } from "./sharing.ts";
export { firstToClip, levelsOf, meetingsOf, type Level, type Meeting } from "./levels.ts";
export {
  knobsOf,
  levelRanges,
  levelsAtKnobEnds,
  withKnob,
  type Knob,
  type KnobEnds,
  type LevelRange,
} from "./knobs.ts";
export {
  budgetOf,
  supplyConditions,
  supplyOf,
  type BudgetEntry,
  type RailBudget,
  type SupplyBudget,
  type SupplyConditions,
} from "./supply.ts";
export * from "./checks/index.ts";
export { levelPlanOf, type LevelPlan } from "./levelPlan.ts";
