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
