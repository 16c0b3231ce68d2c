import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; the pulse through a real junction is checked by scipy",
    provenance: "derived",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  { id: "memory", title: "Data-sheet knowledge of the class, not re-read", provenance: "from memory" },
  {
    id: "breakdown",
    title: "Bench articles on reverse-biased base-emitter junctions",
    place: "breakdown of small devices at 4.5 to 7 V",
    provenance: "published",
  },
  {
    id: "bounce",
    title: "Engineering-magazine switch-bounce measurements",
    place: "average 1.6 ms, worst 6.2 ms; quoted second-hand",
    provenance: "published",
  },
  {
    id: "jfet-op-amp",
    title: "Data-sheet text of JFET-input op amps",
    place: "phase reversal below the negative common-mode limit",
    provenance: "published",
  },
] as const satisfies readonly Citation[];
