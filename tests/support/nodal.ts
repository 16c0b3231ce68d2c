import { create, complexDependencies, lusolveDependencies, type Complex, type Matrix } from "mathjs";
import type { Network } from "#lib/circuit/index.ts";

// As it comes, mathjs takes anything below 1e-15 for zero while it solves, and a filter's far skirts lie below that.
const { complex, lusolve } = create({ ...complexDependencies, ...lusolveDependencies }, { absTol: 0 });

/**
 * Modified nodal analysis of a drawn network, kept apart from the library on purpose: it knows nothing of transfer
 * functions. Every node has an unknown voltage and every op amp an unknown output current; one complex linear system is
 * solved per frequency by mathjs.
 */
export type Element =
  | { kind: "resistor"; nodes: readonly [string, string]; value: number }
  | { kind: "capacitor"; nodes: readonly [string, string]; value: number }
  | ({ kind: "op-amp"; plus: string; minus: string; out: string } & OpAmpModel);

/** 1/A(s) = 1/openLoopGain + s/(2π·gainBandwidth), behind an output resistance. */
export interface OpAmpModel {
  /** Hz; null for an ideal op amp, whose inputs are then held equal. */
  gainBandwidth: number | null;
  openLoopGain: number | null;
  outputResistance: number;
}

/**
 * The net list of a drawn network. A part of value zero is a short circuit: its two nodes become one.
 *
 * @param values ohms and farads by part key
 */
export function netListOf(network: Network, values: Record<string, number>, opAmp: OpAmpModel): Element[] {
  const elements: Element[] = [];
  const joined = new Map<string, string>();
  for (const item of network.items) {
    if (item.draw === "op-amp") elements.push({ kind: "op-amp", ...item.nodes, ...opAmp });
    if (item.draw !== "part") continue;
    const value = values[item.part];
    if (value === undefined) throw new Error(`netListOf: no value for ${item.part}`);
    if (value === 0) joined.set(item.nodes[0], item.nodes[1]);
    else elements.push({ kind: item.symbol === "capacitor" ? "capacitor" : "resistor", nodes: item.nodes, value });
  }
  return elements.map((element) => renamed(element, (node) => joined.get(node) ?? node));
}

function renamed(element: Element, name: (node: string) => string): Element {
  if (element.kind !== "op-amp") return { ...element, nodes: [name(element.nodes[0]), name(element.nodes[1])] };
  return { ...element, plus: name(element.plus), minus: name(element.minus), out: name(element.out) };
}

/** A series resistor in front of a node: the node named `inside` is reached from `outside` through it. */
export function withSource(elements: Element[], inside: string, outside: string, resistance: number): Element[] {
  if (resistance === 0) return elements.map((e) => renamed(e, (node) => (node === inside ? outside : node)));
  return [...elements, { kind: "resistor", nodes: [outside, inside], value: resistance }];
}

/** V(output)/V(input) at a frequency in Hz, with `input` driven by an ideal source and node "0" as ground. */
export function nodalTransfer(elements: Element[], input: string, output: string): (frequency: number) => Complex {
  const names = new Set<string>();
  for (const e of elements)
    for (const node of e.kind === "op-amp" ? [e.plus, e.minus, e.out] : e.nodes) names.add(node);
  names.delete("0");
  names.delete(input);
  const nodes = [...names];
  const opAmps = elements.filter((e) => e.kind === "op-amp");
  const size = nodes.length + opAmps.length;
  const row = (node: string) => nodes.indexOf(node);

  return (frequency) => {
    const omega = 2 * Math.PI * frequency;
    const matrix = Array.from({ length: size }, () => Array.from({ length: size }, () => complex(0, 0)));
    const right = Array.from({ length: size }, () => [complex(0, 0)]);
    const addTo = (r: number, node: string, re: number, im: number) => {
      if (node === "0") return;
      const cell = node === input ? right[r]![0]! : matrix[r]![row(node)]!;
      const sign = node === input ? -1 : 1;
      cell.re += sign * re;
      cell.im += sign * im;
    };
    for (const e of elements) {
      if (e.kind === "op-amp") continue;
      const [re, im] = e.kind === "resistor" ? [1 / e.value, 0] : [0, omega * e.value];
      const [a, b] = e.nodes;
      for (const [from, to] of [
        [a, b],
        [b, a],
      ] as const) {
        if (from === "0" || from === input) continue;
        addTo(row(from), from, re, im);
        addTo(row(from), to, -re, -im);
      }
    }
    for (const [k, u] of opAmps.entries()) {
      const current = nodes.length + k;
      // The op amp pushes its current into the output node.
      matrix[row(u.out)]![current]!.re -= 1;
      if (u.gainBandwidth === null) {
        addTo(current, u.plus, 1, 0);
        addTo(current, u.minus, -1, 0);
        continue;
      }
      // (V(out) + Ro·I)/A = V(plus) − V(minus)
      const [re, im] = [u.openLoopGain === null ? 0 : 1 / u.openLoopGain, omega / (2 * Math.PI * u.gainBandwidth)];
      addTo(current, u.out, re, im);
      matrix[current]![current]!.re += re * u.outputResistance;
      matrix[current]![current]!.im += im * u.outputResistance;
      addTo(current, u.plus, -1, 0);
      addTo(current, u.minus, 1, 0);
    }
    const solution = lusolve(matrix as never, right as never) as unknown as Complex[][] | Matrix;
    const rows = (Array.isArray(solution) ? solution : solution.toArray()) as Complex[][];
    return rows[row(output)]![0]!;
  };
}
