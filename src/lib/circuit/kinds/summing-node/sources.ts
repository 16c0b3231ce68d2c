import type { Citation } from "../../stage/citation.ts";

export const sources = [
  {
    id: "sum-derivation",
    title: "Node equation of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "neets",
    title: "US Navy, NEETS Module 8, Introduction to Amplifiers",
    place: "figure 3-23, summing amplifier",
    provenance: "published",
  },
  {
    id: "noise-gain-note",
    title: "Texas Instruments, SBOA270, inverting amplifier circuit",
    place: "bandwidth from the noise gain",
    provenance: "published",
  },
  { id: "practice", title: "Common practice in the trade, no source", provenance: "common practice" },
] as const satisfies readonly Citation[];
