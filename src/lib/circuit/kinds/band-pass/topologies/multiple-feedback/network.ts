import type { Network } from "../../../../stage/network.ts";

/** Drawn with the signal from left to right and ground at the foot. */
export const network: Network = {
  width: 22,
  height: 15,
  items: [
    { draw: "port", at: [1, 9], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 9],
        [2, 9],
      ],
    },
    { draw: "part", part: "ra", symbol: "resistor", from: [2, 9], to: [6, 9], nodes: ["in", "x"] },
    { draw: "dot", at: [6, 9] },
    { draw: "node", at: [6, 9], label: "x" },
    { draw: "part", part: "rb", symbol: "resistor", from: [6, 9], to: [6, 11.5], nodes: ["x", "y"] },
    { draw: "part", part: "rbPot", symbol: "rheostat", from: [6, 11.5], to: [6, 14], nodes: ["y", "0"] },
    { draw: "ground", at: [6, 14] },
    {
      draw: "wire",
      through: [
        [6, 9],
        [6, 3],
        [9, 3],
      ],
    },
    { draw: "part", part: "c1", symbol: "capacitor", from: [9, 3], to: [12, 3], nodes: ["x", "o"] },
    {
      draw: "wire",
      through: [
        [12, 3],
        [18, 3],
        [18, 10],
      ],
    },
    { draw: "part", part: "c2", symbol: "capacitor", from: [6, 9], to: [10, 9], nodes: ["x", "m"] },
    { draw: "dot", at: [10, 9] },
    {
      draw: "wire",
      through: [
        [10, 9],
        [13, 9],
      ],
    },
    {
      draw: "wire",
      through: [
        [10, 9],
        [10, 6],
        [11, 6],
      ],
    },
    { draw: "part", part: "rf", symbol: "resistor", from: [11, 6], to: [15, 6], nodes: ["o", "m"] },
    {
      draw: "wire",
      through: [
        [15, 6],
        [18, 6],
      ],
    },
    { draw: "dot", at: [18, 6] },
    { draw: "op-amp", name: "U", at: [17, 10], nodes: { plus: "0", minus: "m", out: "o" } },
    {
      draw: "wire",
      through: [
        [13, 11],
        [12, 11],
        [12, 14],
      ],
    },
    { draw: "ground", at: [12, 14] },
    {
      draw: "wire",
      through: [
        [17, 10],
        [21, 10],
      ],
    },
    { draw: "dot", at: [18, 10] },
    { draw: "port", at: [21, 10], label: "out", side: "right" },
  ],
};
