/** The calculation library: what the rest of Clatterbench may use of it. The registry stands apart, in `kinds/index.ts`. */
export { parseQuantity, type Parsed } from "./quantity/parse.ts";
export { parseMarking, type Marking } from "./quantity/marking.ts";
export { formatPartValue, formatQuantity, formatTyped, printQuantity, type Printed } from "./quantity/format.ts";
export { units, type Unit } from "./quantity/units.ts";
export { preferredSeries, seriesNames, type SeriesName } from "./parts/preferredSeries.ts";
export { isInSeries, nearestInSeries, seriesBetween, stepAlongSeries, type ValueSeries } from "./parts/series.ts";
export { potFraction, type PotLaw } from "./parts/potLaw.ts";
export * from "./stage/fields.ts";
export { midSentence } from "./stage/midSentence.ts";
export { formatShown, perCent, printShown, type Shown } from "./stage/shown.ts";
export type { Warning, Severity } from "./stage/warning.ts";
export type { Citation, Formula, Provenance } from "./stage/citation.ts";
export { spacedValues, type Axis, type Curve, type Line } from "./stage/curve.ts";
export type { DrawnItem, Network, Point } from "./stage/network.ts";
export type { AnyTopology, DesignRefusal } from "./stage/topology.ts";
export { defineTopology } from "./stage/topology.ts";
export { defineStageKind, type Port, type PortSort, type ReferenceCase, type StageKind } from "./stage/kind.ts";
export {
  completeConditions,
  defaultParts,
  defaultTargets,
  isAccepted,
  type PlainConditions,
  type PlainValues,
} from "./stage/defaults.ts";
export { analyseStage, type Analysis, type AnalysisRequest } from "./stage/analyse.ts";
export { targetWindows, type TargetState, type Windows } from "./stage/targets.ts";
export { plotStage, type PlottedLine, type PlotRequest } from "./stage/plot.ts";
export { meritStatement, solveStage, type Candidate, type Solution, type SolveRequest } from "./analysis/solve.ts";
export { designExactly, isRefusal } from "./analysis/design.ts";
export { sensitivities } from "./analysis/sensitivity.ts";
export { declaredChanges, libraryVersion, type DeclaredChange } from "./version.ts";
export { topologyOf, type DocumentLink, type DocumentStage, type VoiceDocument } from "./voice/document.ts";
export { analyseStages, type StageWarning, type VoiceAnalysis } from "./voice/analyseStages.ts";
export * from "./compare/index.ts";
