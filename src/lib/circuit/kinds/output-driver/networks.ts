import type { DrawnItem, Network } from "../../stage/network.ts";

/** Op amp output at (18, 8), then R_o, C_out and the jack. */
const output: readonly DrawnItem[] = [
  {
    draw: "wire",
    through: [
      [18, 8],
      [20, 8],
    ],
  },
  { draw: "dot", at: [19, 8] },
  { draw: "part", part: "ro", symbol: "resistor", from: [20, 8], to: [24, 8], nodes: ["o", "z"] },
  { draw: "part", part: "cout", symbol: "capacitor", from: [24, 8], to: [28, 8], nodes: ["z", "jack"] },
  {
    draw: "wire",
    through: [
      [28, 8],
      [30, 8],
    ],
  },
  { draw: "port", at: [30, 8], label: "out", side: "right" },
];

export const invertingNetwork: Network = {
  width: 31,
  height: 13,
  items: [
    { draw: "port", at: [1, 7], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 7],
        [2, 7],
      ],
    },
    { draw: "part", part: "cin", symbol: "capacitor", from: [2, 7], to: [6, 7], nodes: ["in", "i"] },
    { draw: "part", part: "ri", symbol: "resistor", from: [6, 7], to: [10, 7], nodes: ["i", "m"] },
    {
      draw: "wire",
      through: [
        [10, 7],
        [14, 7],
      ],
    },
    { draw: "dot", at: [12, 7] },
    {
      draw: "wire",
      through: [
        [12, 7],
        [12, 3],
        [13, 3],
      ],
    },
    { draw: "part", part: "rf", symbol: "resistor", from: [13, 3], to: [17, 3], nodes: ["o", "m"] },
    {
      draw: "wire",
      through: [
        [17, 3],
        [19, 3],
        [19, 8],
      ],
    },
    { draw: "op-amp", name: "U", at: [18, 8], nodes: { plus: "0", minus: "m", out: "o" } },
    {
      draw: "wire",
      through: [
        [14, 9],
        [14, 11],
      ],
    },
    { draw: "ground", at: [14, 11] },
    ...output,
  ],
};

export const nonInvertingNetwork: Network = {
  width: 31,
  height: 19,
  items: [
    { draw: "port", at: [1, 7], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 7],
        [2, 7],
      ],
    },
    { draw: "part", part: "cin", symbol: "capacitor", from: [2, 7], to: [6, 7], nodes: ["in", "p"] },
    {
      draw: "wire",
      through: [
        [6, 7],
        [14, 7],
      ],
    },
    { draw: "dot", at: [8, 7] },
    { draw: "part", part: "rb", symbol: "resistor", from: [8, 7], to: [8, 11], nodes: ["p", "0"] },
    { draw: "ground", at: [8, 11] },
    { draw: "op-amp", name: "U", at: [18, 8], plusAbove: true, nodes: { plus: "p", minus: "m", out: "o" } },
    {
      draw: "wire",
      through: [
        [14, 9],
        [14, 12],
      ],
    },
    { draw: "dot", at: [14, 12] },
    { draw: "part", part: "rf", symbol: "resistor", from: [14, 12], to: [19, 12], nodes: ["o", "m"] },
    {
      draw: "wire",
      through: [
        [19, 12],
        [19, 8],
      ],
    },
    { draw: "part", part: "ri", symbol: "resistor", from: [14, 12], to: [14, 17], nodes: ["m", "0"] },
    { draw: "ground", at: [14, 17] },
    ...output,
  ],
};
