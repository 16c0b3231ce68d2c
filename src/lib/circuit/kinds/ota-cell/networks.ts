import type { DrawnItem, Network } from "../../stage/network.ts";

/** Divider, amplifier and bias pin, alike in both cells; the output comes out at (12, 6). */
const front: readonly DrawnItem[] = [
  { draw: "port", at: [1, 5], label: "in", side: "left" },
  {
    draw: "wire",
    through: [
      [1, 5],
      [2, 5],
    ],
  },
  { draw: "part", part: "rin", symbol: "resistor", from: [2, 5], to: [5, 5], nodes: ["in", "p"] },
  { draw: "dot", at: [5, 5] },
  { draw: "node", at: [5, 6], label: "p" },
  { draw: "part", part: "rsh", symbol: "resistor", from: [5, 5], to: [5, 9], nodes: ["p", "0"] },
  { draw: "ground", at: [5, 9] },
  {
    draw: "wire",
    through: [
      [5, 5],
      [8, 5],
    ],
  },
  { draw: "ota", name: "U1", at: [12, 6], plusAbove: true, nodes: { plus: "p", minus: "0", out: "x", bias: "bias" } },
  {
    draw: "wire",
    through: [
      [8, 7],
      [7, 7],
      [7, 9],
    ],
  },
  { draw: "ground", at: [7, 9] },
  {
    draw: "wire",
    through: [
      [10, 8],
      [10, 12],
      [8, 12],
    ],
  },
  { draw: "port", at: [8, 12], label: "bias", side: "left" },
  { draw: "dot", at: [14, 6] },
  { draw: "node", at: [14, 6], label: "x" },
];

export const transimpedanceNetwork: Network = {
  width: 26,
  height: 13,
  items: [
    ...front,
    {
      draw: "wire",
      through: [
        [12, 6],
        [17, 6],
      ],
    },
    {
      draw: "wire",
      through: [
        [14, 6],
        [14, 3],
        [15, 3],
      ],
    },
    { draw: "dot", at: [14, 3] },
    { draw: "part", part: "rf", symbol: "resistor", from: [15, 3], to: [19, 3], nodes: ["x", "o"] },
    {
      draw: "wire",
      through: [
        [19, 3],
        [22, 3],
        [22, 7],
      ],
    },
    {
      draw: "wire",
      through: [
        [14, 3],
        [14, 0],
        [15, 0],
      ],
    },
    { draw: "part", part: "cf", symbol: "capacitor", from: [15, 0], to: [19, 0], nodes: ["x", "o"] },
    {
      draw: "wire",
      through: [
        [19, 0],
        [22, 0],
        [22, 3],
      ],
    },
    { draw: "dot", at: [22, 3] },
    { draw: "op-amp", name: "U2", at: [21, 7], nodes: { plus: "0", minus: "x", out: "o" } },
    {
      draw: "wire",
      through: [
        [17, 8],
        [16, 8],
        [16, 10],
      ],
    },
    { draw: "ground", at: [16, 10] },
    {
      draw: "wire",
      through: [
        [21, 7],
        [25, 7],
      ],
    },
    { draw: "dot", at: [22, 7] },
    { draw: "port", at: [25, 7], label: "out", side: "right" },
  ],
};

export const resistorLoadNetwork: Network = {
  width: 26,
  height: 13,
  items: [
    ...front,
    {
      draw: "wire",
      through: [
        [12, 6],
        [19, 6],
      ],
    },
    { draw: "part", part: "rl", symbol: "resistor", from: [14, 6], to: [14, 10], nodes: ["x", "0"] },
    { draw: "ground", at: [14, 10] },
    { draw: "dot", at: [17, 6] },
    { draw: "part", part: "cl", symbol: "capacitor", from: [17, 6], to: [17, 10], nodes: ["x", "0"] },
    { draw: "ground", at: [17, 10] },
    { draw: "block", label: "×1", from: [19, 5], to: [22, 7] },
    {
      draw: "wire",
      through: [
        [22, 6],
        [25, 6],
      ],
    },
    { draw: "port", at: [25, 6], label: "out", side: "right" },
  ],
};
