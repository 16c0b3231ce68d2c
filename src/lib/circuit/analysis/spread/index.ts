/** Spread and yield of any stage: apart from the library's front door, since pages load it only when it is asked for. */
export {
  mostBoards,
  referenceTemperature,
  type BoardsRequest,
  type Distribution,
  type Range,
  type ResultWindows,
  type SpreadRequest,
} from "./request.ts";
export { runSpread, spreadOutcome, spreadStage, type SpreadOutcome, type SpreadRun } from "./spread.ts";
export { spreadOf, yieldOf, type ResultSpread, type Yield } from "./statistics.ts";
export { worstCaseStatements, type WorstCase } from "./worstCase.ts";
export { remedyStatement, runRemedy, type Remedy } from "./remedy.ts";
export type { Band } from "./band.ts";
export { mostBandBoards } from "./band.ts";
export { relativeSlopes } from "./slopes.ts";
export { histogramOf, viewSpread, type Histogram, type SpreadLook, type SpreadView } from "./view.ts";
