import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "trim-derivation",
    title: "Series resistance and loaded divider, solved by hand",
    place: "this page; the divider checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "pot-standard",
    title: "IEC 60393-1:2008, Potentiometers for use in electronic equipment, generic specification",
    place: "scope; the tables of laws were not read",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
  {
    id: "memory",
    title: "Data-sheet knowledge of the class, not re-read",
    place: "mid-travel shares, electrical travel, end resistance, tolerance of tracks",
    provenance: "from memory",
  },
] as const satisfies readonly Citation[];
