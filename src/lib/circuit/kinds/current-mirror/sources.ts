import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "mirror-derivation",
    title: "Currents at the reference node, with I_c = I_s·exp(V_BE/V_T)·(1 + V_CE/V_A) and I_b = I_c/β",
    place: "this page; checked by an independent solution with scipy",
    provenance: "derived",
  },
  {
    id: "sedra-smith",
    title: "Sedra and Smith, Microelectronic Circuits",
    place: "exercise 8.26 (simple against Wilson), problem 8.11 (Early effect)",
    provenance: "published",
  },
  {
    id: "early-note",
    title: "Trade-magazine design note on Early effect and emitter degeneration in mirrors",
    place: "slope near 1 % per volt",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  {
    id: "memory",
    title: "Data-sheet knowledge of the class, not re-read",
    place: "saturation at 0.2 V, 2 mV per kelvin, mismatch of pairs",
    provenance: "from memory",
  },
] as const satisfies readonly Citation[];
