import type { Citation } from "../../stage/citation.ts";

const sources = [
  {
    id: "mfb-derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "sallen-key-derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "two-integrator-derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "bridged-t-derivation",
    title: "Node equations of the network, solved by hand",
    place: "this page; checked by nodal analysis over random parts",
    provenance: "derived",
  },
  {
    id: "passive-derivation",
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
    place: "examples 3.13 (Sallen-Key band-pass), 3.15 (multiple feedback)",
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

/** Those that a topology's formulas and limits name. */
export function sourcesOf(
  formulas: readonly { sources: readonly string[] }[],
  limits: readonly { source: string }[],
): readonly Citation[] {
  const named = new Set([...formulas.flatMap((formula) => formula.sources), ...limits.map(({ source }) => source)]);
  return sources.filter(({ id }) => named.has(id));
}
