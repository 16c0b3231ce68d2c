import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "converter-derivation",
    title: "Loop of op amp, base, emitter and resistor, solved by hand",
    place: "this page; checked by solving Kirchhoff's laws with scipy",
    provenance: "derived",
  },
  {
    id: "dual-ota",
    title: "Data-sheet text of a dual bipolar transconductance amplifier",
    place: "ratings: 2 mA into the bias pin",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  {
    id: "memory",
    title: "Data-sheet knowledge of the class, not re-read",
    place: "bias pin 1.2 to 1.4 V above the rail, V_BE, saturation, 5 V reverse base-emitter limit",
    provenance: "from memory",
  },
  {
    id: "art-of-electronics",
    title: "Horowitz and Hill, The Art of Electronics",
    place: "op-amp current source with a transistor in the loop",
    provenance: "from memory",
  },
] as const satisfies readonly Citation[];
