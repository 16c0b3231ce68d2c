import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "derivation",
    title: "Averages of the static transistor under Gaussian drive",
    place: "this page; checked by scipy's quadrature over the drive",
    provenance: "derived",
  },
  {
    id: "transport",
    title: "The transport form of the Ebers-Moll equations",
    place: "textbooks of semiconductor devices",
    provenance: "from memory",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  {
    id: "breakdown",
    title: "Bench articles on reverse-biased base-emitter junctions",
    place: "breakdown of small devices at 4.5 to 7 V",
    provenance: "published",
  },
] as const satisfies readonly Citation[];
