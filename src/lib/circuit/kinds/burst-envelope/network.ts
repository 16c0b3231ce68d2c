import type { Network } from "../../stage/network.ts";

/** The oscillator above; gate, hit and tail each an RC of its own below. */
export const network: Network = {
  width: 30,
  height: 21,
  items: [
    { draw: "op-amp", name: "U", at: [14, 7], nodes: { plus: "p", minus: "m", out: "o" } },
    {
      draw: "wire",
      through: [
        [10, 6],
        [7, 6],
        [7, 2],
        [9, 2],
      ],
    },
    { draw: "dot", at: [7, 6] },
    { draw: "part", part: "rt", symbol: "resistor", from: [9, 2], to: [13, 2], nodes: ["m", "o"] },
    {
      draw: "wire",
      through: [
        [13, 2],
        [15, 2],
        [15, 12],
        [14, 12],
      ],
    },
    {
      draw: "wire",
      through: [
        [14, 7],
        [18, 7],
      ],
    },
    { draw: "dot", at: [15, 7] },
    { draw: "node", at: [7, 6], label: "m" },
    {
      draw: "wire",
      through: [
        [7, 6],
        [4, 6],
      ],
    },
    { draw: "part", part: "ct", symbol: "capacitor", from: [4, 6], to: [4, 10], nodes: ["m", "0"] },
    { draw: "ground", at: [4, 10] },
    {
      draw: "wire",
      through: [
        [10, 8],
        [9, 8],
        [9, 12],
        [10, 12],
      ],
    },
    { draw: "part", part: "r2", symbol: "resistor", from: [10, 12], to: [14, 12], nodes: ["p", "o"] },
    { draw: "dot", at: [9, 12] },
    { draw: "part", part: "r1", symbol: "resistor", from: [9, 12], to: [9, 16], nodes: ["p", "0"] },
    { draw: "ground", at: [9, 16] },
    { draw: "diode", name: "D1", from: [18, 7], to: [21, 7], nodes: ["o", "env"] },
    {
      draw: "wire",
      through: [
        [21, 7],
        [29, 7],
      ],
    },
    { draw: "dot", at: [22, 7] },
    { draw: "part", part: "cBurst", symbol: "capacitor", from: [22, 7], to: [22, 11], nodes: ["env", "0"] },
    { draw: "ground", at: [22, 11] },
    { draw: "dot", at: [26, 7] },
    { draw: "part", part: "rBurst", symbol: "resistor", from: [26, 7], to: [26, 11], nodes: ["env", "0"] },
    { draw: "ground", at: [26, 11] },
    { draw: "port", at: [29, 7], label: "envelope", side: "right" },
    { draw: "port", at: [1, 17], label: "trigger", side: "left" },
    { draw: "part", part: "rg", symbol: "resistor", from: [1, 17], to: [5, 17], nodes: ["s", "g"] },
    { draw: "dot", at: [5, 17] },
    { draw: "node", at: [6.6, 17], label: "gate" },
    { draw: "part", part: "cg", symbol: "capacitor", from: [5, 17], to: [5, 20], nodes: ["g", "0"] },
    { draw: "ground", at: [5, 20] },
    { draw: "node", at: [14, 16], label: "end of gate" },
    { draw: "diode", name: "D2", from: [14, 16], to: [17, 16], nodes: ["e", "tail"] },
    {
      draw: "wire",
      through: [
        [17, 16],
        [29, 16],
      ],
    },
    { draw: "dot", at: [18, 16] },
    { draw: "part", part: "cTail", symbol: "capacitor", from: [18, 16], to: [18, 20], nodes: ["tail", "0"] },
    { draw: "ground", at: [18, 20] },
    { draw: "dot", at: [23, 16] },
    { draw: "part", part: "rTail", symbol: "resistor", from: [23, 16], to: [23, 20], nodes: ["tail", "0"] },
    { draw: "ground", at: [23, 20] },
    { draw: "port", at: [29, 16], label: "tail", side: "right" },
  ],
};
