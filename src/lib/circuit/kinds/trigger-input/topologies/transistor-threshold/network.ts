import type { Network } from "../../../../stage/network.ts";

export const network: Network = {
  width: 24,
  height: 14,
  items: [
    { draw: "port", at: [1, 7], label: "jack", side: "left" },
    { draw: "part", part: "rs", symbol: "resistor", from: [1, 7], to: [4, 7], nodes: ["tip", "jack"] },
    { draw: "part", part: "cd", symbol: "capacitor", from: [4, 7], to: [7, 7], nodes: ["jack", "a"] },
    { draw: "dot", at: [7, 7] },
    { draw: "node", at: [7, 8], label: "a" },
    { draw: "part", part: "rd", symbol: "resistor", from: [7, 7], to: [7, 12], nodes: ["a", "0"] },
    { draw: "ground", at: [7, 12] },
    { draw: "part", part: "ra", symbol: "resistor", from: [7, 7], to: [11, 7], nodes: ["a", "b"] },
    { draw: "dot", at: [11, 7] },
    { draw: "part", part: "rb", symbol: "resistor", from: [11, 7], to: [11, 12], nodes: ["b", "0"] },
    { draw: "ground", at: [11, 12] },
    {
      draw: "wire",
      through: [
        [11, 7],
        [17, 7],
      ],
    },
    { draw: "dot", at: [14, 7] },
    { draw: "diode", name: "D", from: [14, 12], to: [14, 7], nodes: ["0", "b"] },
    { draw: "ground", at: [14, 12] },
    {
      draw: "transistor",
      name: "Q",
      polarity: "npn",
      at: [17, 7],
      nodes: { base: "b", collector: "c", emitter: "0" },
    },
    { draw: "ground", at: [19, 9] },
    { draw: "rail", at: [19, 1], label: "V+" },
    { draw: "part", part: "rc", symbol: "resistor", from: [19, 1], to: [19, 5], nodes: ["vp", "c"] },
    { draw: "dot", at: [19, 5] },
    {
      draw: "wire",
      through: [
        [19, 5],
        [23, 5],
      ],
    },
    { draw: "port", at: [23, 5], label: "pulse, inverted", side: "right" },
  ],
};
