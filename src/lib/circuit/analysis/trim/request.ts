import type { PotLaw, PotLawShape } from "../../parts/potLaw.ts";
import type { BoardsRequest, Range } from "../spread/request.ts";

/** How a knob turns: what its law makes of the rotation, and what its ends leave over. */
export interface Knob {
  law: PotLaw;
  shape: PotLawShape;
  /** Share of the track at mid-travel, of a logarithmic law. */
  midFraction: number;
  /** Share of the track that is left over at an end. */
  endResistance: number;
  /** Degrees of electrical travel. */
  electricalAngle: number;
}

export interface TrimRequest extends BoardsRequest {
  knob: Knob;
  /** The result that is set with the knob. */
  result: string;
  /** What it must reach. */
  window: Range;
  /** The one figure that each board is set to; the middle of the window where left out. */
  target?: number;
}
