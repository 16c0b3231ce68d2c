import type { Network } from "../../../../stage/network.ts";

/** Signal from left to right; positive feedback over the top, the gain divider at the foot. */
export const network: Network = {
  width: 24,
  height: 18,
  items: [
    { draw: "port", at: [1, 7], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 7],
        [2, 7],
      ],
    },
    { draw: "part", part: "r1", symbol: "resistor", from: [2, 7], to: [6, 7], nodes: ["in", "x"] },
    { draw: "dot", at: [6, 7] },
    { draw: "node", at: [6, 7], label: "x" },
    { draw: "part", part: "c1", symbol: "capacitor", from: [6, 7], to: [6, 11], nodes: ["x", "0"] },
    { draw: "ground", at: [6, 11] },
    {
      draw: "wire",
      through: [
        [6, 7],
        [6, 3],
        [10, 3],
      ],
    },
    { draw: "part", part: "r3", symbol: "resistor", from: [10, 3], to: [14, 3], nodes: ["o", "x"] },
    {
      draw: "wire",
      through: [
        [14, 3],
        [20, 3],
        [20, 8],
      ],
    },
    { draw: "part", part: "c2", symbol: "capacitor", from: [6, 7], to: [11, 7], nodes: ["x", "p"] },
    { draw: "dot", at: [11, 7] },
    {
      draw: "wire",
      through: [
        [11, 7],
        [15, 7],
      ],
    },
    { draw: "part", part: "r2", symbol: "resistor", from: [11, 7], to: [11, 11], nodes: ["p", "y"] },
    { draw: "part", part: "r2Pot", symbol: "rheostat", from: [11, 11], to: [11, 15], nodes: ["y", "0"] },
    { draw: "ground", at: [11, 15] },
    { draw: "op-amp", name: "U", at: [19, 8], plusAbove: true, nodes: { plus: "p", minus: "g", out: "o" } },
    {
      draw: "wire",
      through: [
        [15, 9],
        [15, 12],
      ],
    },
    { draw: "dot", at: [15, 12] },
    { draw: "part", part: "rf", symbol: "resistor", from: [15, 12], to: [20, 12], nodes: ["g", "o"] },
    { draw: "part", part: "rg", symbol: "resistor", from: [15, 12], to: [15, 16], nodes: ["g", "0"] },
    { draw: "ground", at: [15, 16] },
    {
      draw: "wire",
      through: [
        [20, 12],
        [20, 8],
      ],
    },
    {
      draw: "wire",
      through: [
        [19, 8],
        [23, 8],
      ],
    },
    { draw: "dot", at: [20, 8] },
    { draw: "port", at: [23, 8], label: "out", side: "right" },
  ],
};
