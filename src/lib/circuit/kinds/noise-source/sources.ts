import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "derivation",
    title: "Node equations of the board and integrals of its density, solved by hand",
    place: "this page; checked by nodal analysis and by scipy's quadrature",
    provenance: "derived",
  },
  {
    id: "sobering",
    title: "T. J. Sobering, Technote 1, Equivalent Noise Bandwidth (1991, revised 2008)",
    place: "equations 1 to 6 and table 1",
    provenance: "published",
  },
  {
    id: "encyclopedia",
    title: "Open encyclopedia, Johnson–Nyquist noise",
    place: "noise voltage of a resistor; 4.07 nV/√Hz of 1 kΩ at 300 K",
    provenance: "published",
  },
  {
    id: "si",
    title: "SI Brochure, 9th edition (2019)",
    place: "section 2.3.1, Boltzmann constant and elementary charge",
    provenance: "published",
  },
  {
    id: "breakdown",
    title: "Bench articles on reverse-biased base-emitter junctions",
    place: "breakdown of small devices at 4.5 to 7 V",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  {
    id: "memory",
    title: "Textbooks and data-sheet knowledge of the class, not re-read",
    provenance: "from memory",
  },
] as const satisfies readonly Citation[];
