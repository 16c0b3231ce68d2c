import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "dual-ota",
    title: "Data-sheet text of a dual bipolar transconductance amplifier with linearising diodes",
    place: "circuit description (hyperbolic tangent, current-drive limit), absolute maximum ratings",
    provenance: "published",
  },
  {
    id: "pair-derivation",
    title: "Differential pair with predistorting diodes, solved by hand",
    place: "this page; checked by solving Kirchhoff's laws and integrating with scipy",
    provenance: "derived",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  {
    id: "memory",
    title: "Data-sheet knowledge of the class, not re-read",
    place: "noise factor, swing of the op amp, treatment of an unused half",
    provenance: "from memory",
  },
] as const satisfies readonly Citation[];
