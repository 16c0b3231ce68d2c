import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "derivation",
    title: "Charge and discharge of the capacitor, solved by hand and by numeric integration",
    place: "this page; checked by scipy's stiff integrators",
    provenance: "derived",
  },
  {
    id: "time-constants",
    title: "US Army correspondence course MM0704",
    place: "time constants, figure 1-14",
    provenance: "published",
  },
  {
    id: "extrapolation",
    title: "E. Hairer and G. Wanner, Solving Ordinary Differential Equations II",
    place: "section IV.9, extrapolation of the linearly implicit Euler method",
    provenance: "from memory",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  { id: "memory", title: "Data-sheet knowledge of the class, not re-read", provenance: "from memory" },
  {
    id: "dielectrics",
    title: "Capacitor-maker dielectric comparison tables",
    place: "class 2 ceramics",
    provenance: "published",
  },
] as const satisfies readonly Citation[];
