import type { Network } from "../../stage/network.ts";

/** The envelope is the supply, so it enters from above. */
export const network: Network = {
  width: 26,
  height: 14,
  items: [
    { draw: "port", at: [1, 8], label: "noise", side: "left" },
    { draw: "part", part: "ci", symbol: "capacitor", from: [1, 8], to: [4, 8], nodes: ["in", "a"] },
    { draw: "part", part: "ri", symbol: "resistor", from: [4, 8], to: [8, 8], nodes: ["a", "b"] },
    { draw: "dot", at: [8, 8] },
    { draw: "part", part: "rb", symbol: "resistor", from: [8, 8], to: [8, 12], nodes: ["b", "0"] },
    { draw: "ground", at: [8, 12] },
    {
      draw: "wire",
      through: [
        [8, 8],
        [11, 8],
      ],
    },
    {
      draw: "transistor",
      name: "Q",
      polarity: "npn",
      at: [11, 8],
      nodes: { base: "b", collector: "c", emitter: "0" },
    },
    { draw: "ground", at: [13, 10] },
    { draw: "port", at: [11, 2], label: "envelope", side: "left" },
    {
      draw: "wire",
      through: [
        [11, 2],
        [13, 2],
      ],
    },
    { draw: "part", part: "rc", symbol: "resistor", from: [13, 2], to: [13, 6], nodes: ["env", "c"] },
    { draw: "dot", at: [13, 6] },
    { draw: "node", at: [13, 6], label: "c" },
    {
      draw: "wire",
      through: [
        [13, 6],
        [17, 6],
      ],
    },
    { draw: "part", part: "co", symbol: "capacitor", from: [17, 6], to: [20, 6], nodes: ["c", "y"] },
    { draw: "dot", at: [21, 6] },
    {
      draw: "wire",
      through: [
        [20, 6],
        [25, 6],
      ],
    },
    { draw: "part", part: "ro", symbol: "resistor", from: [21, 6], to: [21, 11], nodes: ["y", "0"] },
    { draw: "ground", at: [21, 11] },
    { draw: "port", at: [25, 6], label: "out", side: "right" },
  ],
};
