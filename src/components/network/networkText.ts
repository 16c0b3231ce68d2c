import type { AnyTopology, Network } from "#lib/circuit/index.ts";

export interface PartMarking {
  /** Designator, or the symbol where none is given yet. */
  name: string;
  /** "22k", or "not fitted". */
  value: string;
}

/** The network in words, part by part: "R_A 22k from in to x". Node 0 is ground. */
export function networkText(topology: AnyTopology, markings: Record<string, PartMarking>): string {
  const sentences = topology.network.items.flatMap((item) => sentenceOf(item, markings) ?? []);
  return sentences.join(". ") + ".";
}

function sentenceOf(item: Network["items"][number], markings: Record<string, PartMarking>): string | undefined {
  if (item.draw === "part") {
    const { name, value } = markings[item.part]!;
    return `${name} ${value} from ${node(item.nodes[0])} to ${node(item.nodes[1])}`;
  }
  if (item.draw === "op-amp") {
    const { plus, minus, out } = item.nodes;
    return `Op amp ${item.name}: + at ${node(plus)}, \u2212 at ${node(minus)}, output at ${node(out)}`;
  }
  return undefined;
}

const node = (name: string) => (name === "0" ? "ground" : name);
