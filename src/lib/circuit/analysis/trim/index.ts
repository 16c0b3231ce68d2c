/** Trims of any stage with a pot: apart from the library's front door, since pages load it only when it is asked for. */
export type { Knob, TrimRequest } from "./request.ts";
export { turn, turnedPots, usualKnob, type TurnedPot } from "./turning.ts";
export { rotationFor, usefulRotation } from "./travel.ts";
export { middleOf, trimCoverage, trimFigures, type TrimCoverage, type TrimEnd, type TrimFigures } from "./trim.ts";
export { runRevalue, revalueStatement, type Revalued, type Revaluation, type RevalueWish } from "./revalue.ts";
