import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "mfb-derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "op-amps-for-everyone",
    title: "Op Amps for Everyone (R. Mancini ed., SLOD006B, August 2002)",
    place: "section 16.5.1.2, figure 16-34 and example 16-5",
    provenance: "published",
  },
  {
    id: "franco",
    title: "S. Franco, Design with Operational Amplifiers and Analog Integrated Circuits",
    place: "example 3.15, multiple-feedback band-pass",
    provenance: "published",
  },
  {
    id: "noise-bandwidth",
    title:
      "Åström, Jury and Agniel, A numerical method for the evaluation of complex integrals, IEEE Trans. Autom. Control 15 (1970)",
    place: "the recursion",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  { id: "memory", title: "Data-sheet knowledge of the class, not re-read", provenance: "from memory" },
  {
    id: "jfet-op-amp",
    title: "Data-sheet text of JFET-input op amps",
    place: "output swing into 10 kΩ",
    provenance: "published",
  },
  {
    id: "dielectrics",
    title: "Capacitor-maker dielectric comparison tables",
    place: "class 2 ceramics",
    provenance: "published",
  },
] as const satisfies readonly Citation[];
