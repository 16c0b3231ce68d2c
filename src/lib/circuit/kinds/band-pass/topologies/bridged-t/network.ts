import type { Network } from "../../../../stage/network.ts";

/** The T hangs between inverting input and output, bridged by R2. */
export const network: Network = {
  width: 24,
  height: 18,
  items: [
    { draw: "port", at: [1, 13], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 13],
        [2, 13],
      ],
    },
    { draw: "part", part: "rin", symbol: "resistor", from: [2, 13], to: [6, 13], nodes: ["in", "m"] },
    {
      draw: "wire",
      through: [
        [6, 13],
        [15, 13],
      ],
    },
    { draw: "dot", at: [7, 13] },
    {
      draw: "wire",
      through: [
        [7, 13],
        [7, 2],
        [11, 2],
      ],
    },
    { draw: "dot", at: [7, 5] },
    { draw: "part", part: "r2", symbol: "resistor", from: [11, 2], to: [15, 2], nodes: ["o", "m"] },
    {
      draw: "wire",
      through: [
        [15, 2],
        [20, 2],
        [20, 14],
      ],
    },
    { draw: "part", part: "c1", symbol: "capacitor", from: [7, 5], to: [13, 5], nodes: ["m", "x"] },
    { draw: "dot", at: [13, 5] },
    { draw: "node", at: [13, 5], label: "x" },
    { draw: "part", part: "c2", symbol: "capacitor", from: [13, 5], to: [19, 5], nodes: ["x", "o"] },
    {
      draw: "wire",
      through: [
        [19, 5],
        [20, 5],
      ],
    },
    { draw: "dot", at: [20, 5] },
    { draw: "part", part: "r1", symbol: "resistor", from: [13, 5], to: [13, 8], nodes: ["x", "y"] },
    { draw: "part", part: "r1Pot", symbol: "rheostat", from: [13, 8], to: [13, 11], nodes: ["y", "0"] },
    { draw: "ground", at: [13, 11] },
    { draw: "op-amp", name: "U", at: [19, 14], nodes: { plus: "0", minus: "m", out: "o" } },
    {
      draw: "wire",
      through: [
        [15, 15],
        [15, 16],
      ],
    },
    { draw: "ground", at: [15, 16] },
    {
      draw: "wire",
      through: [
        [19, 14],
        [23, 14],
      ],
    },
    { draw: "dot", at: [20, 14] },
    { draw: "port", at: [23, 14], label: "out", side: "right" },
  ],
};
