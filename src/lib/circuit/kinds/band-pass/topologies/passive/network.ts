import type { Network } from "../../../../stage/network.ts";

/** High-pass, then low-pass. */
export const network: Network = {
  width: 18,
  height: 10,
  items: [
    { draw: "port", at: [1, 3], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 3],
        [2, 3],
      ],
    },
    { draw: "part", part: "c1", symbol: "capacitor", from: [2, 3], to: [6, 3], nodes: ["in", "a"] },
    { draw: "dot", at: [7, 3] },
    {
      draw: "wire",
      through: [
        [6, 3],
        [8, 3],
      ],
    },
    { draw: "part", part: "r1", symbol: "resistor", from: [7, 3], to: [7, 8], nodes: ["a", "0"] },
    { draw: "ground", at: [7, 8] },
    { draw: "part", part: "r2", symbol: "resistor", from: [8, 3], to: [12, 3], nodes: ["a", "o"] },
    { draw: "dot", at: [13, 3] },
    {
      draw: "wire",
      through: [
        [12, 3],
        [17, 3],
      ],
    },
    { draw: "part", part: "c2", symbol: "capacitor", from: [13, 3], to: [13, 8], nodes: ["o", "0"] },
    { draw: "ground", at: [13, 8] },
    { draw: "port", at: [17, 3], label: "out", side: "right" },
  ],
};
