import type { DrawnItem, Network, Point } from "../../stage/network.ts";

const wire = (...through: Point[]): DrawnItem => ({ draw: "wire", through });

/** One inverting stage whose summing node lies at (x, 7); its output is (x + 6, 8). */
function inverter(
  x: number,
  name: string,
  feedback: string,
  nodes: { input: string; output: string },
): readonly DrawnItem[] {
  return [
    { draw: "dot", at: [x, 7] },
    wire([x, 7], [x + 2, 7]),
    wire([x, 7], [x, 3], [x + 1, 3]),
    {
      draw: "part",
      part: feedback,
      symbol: "resistor",
      from: [x + 1, 3],
      to: [x + 5, 3],
      nodes: [nodes.output, nodes.input],
    },
    wire([x + 5, 3], [x + 6, 3], [x + 6, 8]),
    { draw: "dot", at: [x + 6, 8] },
    wire([x + 2, 9], [x + 1, 9], [x + 1, 11]),
    { draw: "ground", at: [x + 1, 11] },
    { draw: "op-amp", name, at: [x + 6, 8], nodes: { plus: "0", minus: nodes.input, out: nodes.output } },
  ];
}

/** The transistor lies on its head: its emitter is the junction that breaks down, its collector stays open. */
export const network: Network = {
  width: 39,
  height: 13,
  items: [
    wire([2, 5], [1, 5], [1, 11]),
    { draw: "ground", at: [1, 11] },
    {
      draw: "transistor",
      name: "Q",
      polarity: "npn",
      at: [2, 5],
      nodes: { base: "0", collector: "open", emitter: "e" },
    },
    { draw: "rail", at: [7, 1], label: "V+" },
    { draw: "part", part: "rn", symbol: "resistor", from: [7, 1], to: [7, 7], nodes: ["v_p", "e"] },
    wire([4, 7], [10, 7]),
    { draw: "dot", at: [7, 7] },
    { draw: "node", at: [6, 7], label: "e" },
    { draw: "part", part: "cn", symbol: "capacitor", from: [10, 7], to: [13, 7], nodes: ["e", "a"] },
    { draw: "part", part: "r1", symbol: "resistor", from: [13, 7], to: [17, 7], nodes: ["a", "m1"] },
    ...inverter(17, "U1", "rf1", { input: "m1", output: "o1" }),
    wire([23, 8], [24, 8], [24, 7]),
    { draw: "part", part: "r2", symbol: "resistor", from: [24, 7], to: [29, 7], nodes: ["o1", "m2"] },
    ...inverter(29, "U2", "rf2", { input: "m2", output: "out" }),
    wire([35, 8], [38, 8]),
    { draw: "port", at: [38, 8], label: "noise", side: "right" },
  ],
};
