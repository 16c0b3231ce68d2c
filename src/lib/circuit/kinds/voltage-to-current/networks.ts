import type { Network } from "../../stage/network.ts";

/** Op amp on the left, its transistor and emitter resistor to the right, the mirror's reference above. */
export const driverNetwork: Network = {
  width: 19,
  height: 15,
  items: [
    { draw: "port", at: [1, 6], label: "envelope", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 6],
        [4, 6],
      ],
    },
    { draw: "op-amp", name: "U", at: [8, 7], plusAbove: true, nodes: { plus: "env", minus: "e", out: "d" } },
    {
      draw: "wire",
      through: [
        [8, 7],
        [12, 7],
      ],
    },
    {
      draw: "transistor",
      name: "Q",
      polarity: "npn",
      at: [12, 7],
      nodes: { base: "d", collector: "c", emitter: "e" },
    },
    {
      draw: "wire",
      through: [
        [14, 9],
        [14, 10],
      ],
    },
    { draw: "dot", at: [14, 10] },
    { draw: "node", at: [14, 10], label: "e" },
    {
      draw: "wire",
      through: [
        [4, 8],
        [3, 8],
        [3, 10],
        [14, 10],
      ],
    },
    { draw: "dot", at: [11, 10] },
    { draw: "dot", at: [11, 7] },
    { draw: "diode", name: "D", from: [11, 10], to: [11, 7], nodes: ["e", "d"] },
    { draw: "part", part: "re", symbol: "resistor", from: [14, 10], to: [14, 14], nodes: ["e", "0"] },
    { draw: "ground", at: [14, 14] },
    {
      draw: "wire",
      through: [
        [14, 5],
        [14, 3],
        [18, 3],
      ],
    },
    { draw: "port", at: [18, 3], label: "to the mirror", side: "right" },
  ],
};

/** One resistor into the bias pin, whose two junctions are drawn as a block on the negative rail. */
export const resistorNetwork: Network = {
  width: 16,
  height: 9,
  items: [
    { draw: "port", at: [1, 3], label: "envelope", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 3],
        [4, 3],
      ],
    },
    { draw: "part", part: "r", symbol: "resistor", from: [4, 3], to: [8, 3], nodes: ["env", "bias"] },
    {
      draw: "wire",
      through: [
        [8, 3],
        [15, 3],
      ],
    },
    { draw: "dot", at: [11, 3] },
    { draw: "node", at: [11, 3], label: "bias" },
    { draw: "diode", name: "pin", from: [11, 3], to: [11, 7], nodes: ["bias", "vn"] },
    { draw: "rail", at: [11, 7], label: "V−" },
    { draw: "port", at: [15, 3], label: "bias pin", side: "right" },
  ],
};
