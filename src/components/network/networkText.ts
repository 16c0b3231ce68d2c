import type { AnyTopology, DrawnItem } from "#lib/circuit/index.ts";

export interface PartMarking {
  /** Designator, or the symbol where none is given yet. */
  name: string;
  /** "22k", or "not fitted". */
  value: string;
}

/** The network in words, item by item: "R_A 22k from in to x". Node 0 is ground. */
export function networkText(topology: AnyTopology, markings: Record<string, PartMarking>): string {
  const sentences = topology.network.items.flatMap((item) => sentenceOf(item, markings) ?? []);
  return `${sentences.join(". ")}.`;
}

function sentenceOf(item: DrawnItem, markings: Record<string, PartMarking>): string | undefined {
  switch (item.draw) {
    case "part": {
      const { name, value } = markings[item.part]!;
      return `${name} ${value} ${between(item.nodes)}`;
    }
    case "pot": {
      const { name, value } = markings[item.part]!;
      const [from, to, wiper] = item.nodes;
      return `${name} ${value} ${between([from, to])}, wiper at ${node(wiper)}`;
    }
    case "op-amp":
    case "ota": {
      const { plus, minus, out } = item.nodes;
      const bias = item.draw === "ota" ? `, bias at ${node(item.nodes.bias)}` : "";
      const sort = item.draw === "ota" ? "Transconductance amplifier" : "Op amp";
      return `${sort} ${item.name}: + at ${node(plus)}, \u2212 at ${node(minus)}, output at ${node(out)}${bias}`;
    }
    case "transistor": {
      const { base, collector, emitter } = item.nodes;
      return `${item.polarity.toUpperCase()} transistor ${item.name}: base at ${node(base)}, collector at ${node(collector)}, emitter at ${node(emitter)}`;
    }
    case "diode":
      return `Diode ${item.name} ${between(item.nodes)}`;
    case "source":
      return `${item.sort.charAt(0).toUpperCase()}${item.sort.slice(1)} source ${item.name} ${between(item.nodes)}`;
    case "switch":
      return `Switch ${item.name} ${between(item.nodes)}`;
    case "block":
      return `Block: ${item.label}`;
    case "wire":
    case "dot":
    case "ground":
    case "rail":
    case "port":
    case "node":
      return undefined;
  }
}

const between = ([from, to]: readonly [string, string]) => `from ${node(from)} to ${node(to)}`;
const node = (name: string) => (name === "0" ? "ground" : name);
