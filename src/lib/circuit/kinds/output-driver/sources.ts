import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "driver-derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "inverting-note",
    title: "Texas Instruments, SBOA270, inverting amplifier circuit",
    place: "bandwidth from the noise gain; slew rate from frequency and peak",
    provenance: "published",
  },
  {
    id: "si",
    title: "SI Brochure, 9th edition (2019)",
    place: "section 2.3.1, Boltzmann constant",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  { id: "memory", title: "Data-sheet knowledge of the class, not re-read", provenance: "from memory" },
] as const satisfies readonly Citation[];
