import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "derivation",
    title: "Charging between two thresholds, solved by hand",
    place: "this page; checked by scipy with event location",
    provenance: "derived",
  },
  {
    id: "relaxation",
    title: "The op-amp relaxation oscillator of the textbooks, T = 2RC ln((1 + β)/(1 − β))",
    place: "chapters on waveform generation",
    provenance: "from memory",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
] as const satisfies readonly Citation[];
