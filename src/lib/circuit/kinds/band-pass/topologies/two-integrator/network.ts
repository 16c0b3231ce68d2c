import type { Network } from "../../../../stage/network.ts";

/** Summer, first and second integrator from left to right; the loop over the top, damping at the foot. */
export const network: Network = {
  width: 48,
  height: 20,
  items: [
    { draw: "port", at: [1, 9], label: "in", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 9],
        [2, 9],
      ],
    },
    { draw: "part", part: "ri", symbol: "resistor", from: [2, 9], to: [6, 9], nodes: ["in", "s"] },
    { draw: "dot", at: [7, 9] },
    {
      draw: "wire",
      through: [
        [6, 9],
        [9, 9],
      ],
    },
    {
      draw: "wire",
      through: [
        [7, 9],
        [7, 2],
        [9, 2],
      ],
    },
    { draw: "dot", at: [7, 6] },
    {
      draw: "wire",
      through: [
        [7, 6],
        [8, 6],
      ],
    },
    { draw: "part", part: "rb", symbol: "resistor", from: [8, 6], to: [12, 6], nodes: ["hp", "s"] },
    {
      draw: "wire",
      through: [
        [12, 6],
        [14, 6],
        [14, 10],
      ],
    },
    { draw: "part", part: "ra", symbol: "resistor", from: [9, 2], to: [13, 2], nodes: ["lp", "s"] },
    {
      draw: "wire",
      through: [
        [13, 2],
        [45, 2],
        [45, 11],
      ],
    },
    { draw: "op-amp", name: "U1", at: [13, 10], nodes: { plus: "q", minus: "s", out: "hp" } },
    {
      draw: "wire",
      through: [
        [13, 10],
        [15, 10],
      ],
    },
    { draw: "dot", at: [14, 10] },
    { draw: "node", at: [14, 10], label: "hp" },
    { draw: "part", part: "r1", symbol: "resistor", from: [15, 10], to: [19, 10], nodes: ["hp", "v1"] },
    { draw: "part", part: "r1Pot", symbol: "rheostat", from: [19, 10], to: [23, 10], nodes: ["v1", "i1"] },
    { draw: "dot", at: [23, 10] },
    {
      draw: "wire",
      through: [
        [23, 10],
        [24, 10],
      ],
    },
    {
      draw: "wire",
      through: [
        [23, 10],
        [23, 6],
        [24, 6],
      ],
    },
    { draw: "part", part: "c1", symbol: "capacitor", from: [24, 6], to: [28, 6], nodes: ["i1", "bp"] },
    {
      draw: "wire",
      through: [
        [28, 6],
        [29, 6],
        [29, 11],
      ],
    },
    { draw: "op-amp", name: "U2", at: [28, 11], nodes: { plus: "0", minus: "i1", out: "bp" } },
    {
      draw: "wire",
      through: [
        [24, 12],
        [24, 13],
      ],
    },
    { draw: "ground", at: [24, 13] },
    {
      draw: "wire",
      through: [
        [28, 11],
        [30, 11],
      ],
    },
    { draw: "dot", at: [29, 11] },
    { draw: "part", part: "r2", symbol: "resistor", from: [30, 11], to: [34, 11], nodes: ["bp", "v2"] },
    { draw: "part", part: "r2Pot", symbol: "rheostat", from: [34, 11], to: [38, 11], nodes: ["v2", "i2"] },
    {
      draw: "wire",
      through: [
        [38, 11],
        [39, 11],
        [39, 10],
        [40, 10],
      ],
    },
    { draw: "dot", at: [39, 10] },
    {
      draw: "wire",
      through: [
        [39, 10],
        [39, 6],
        [40, 6],
      ],
    },
    { draw: "part", part: "c2", symbol: "capacitor", from: [40, 6], to: [44, 6], nodes: ["i2", "lp"] },
    {
      draw: "wire",
      through: [
        [44, 6],
        [45, 6],
      ],
    },
    { draw: "dot", at: [45, 6] },
    { draw: "op-amp", name: "U3", at: [44, 11], nodes: { plus: "0", minus: "i2", out: "lp" } },
    {
      draw: "wire",
      through: [
        [40, 12],
        [40, 13],
      ],
    },
    { draw: "ground", at: [40, 13] },
    {
      draw: "wire",
      through: [
        [44, 11],
        [45, 11],
      ],
    },
    { draw: "node", at: [45, 11], label: "lp" },
    {
      draw: "wire",
      through: [
        [29, 11],
        [29, 15],
      ],
    },
    { draw: "dot", at: [29, 15] },
    {
      draw: "wire",
      through: [
        [29, 15],
        [47, 15],
      ],
    },
    { draw: "port", at: [47, 15], label: "out", side: "right" },
    {
      draw: "wire",
      through: [
        [29, 15],
        [18, 15],
      ],
    },
    { draw: "part", part: "rq1", symbol: "resistor", from: [14, 15], to: [18, 15], nodes: ["q", "bp"] },
    {
      draw: "wire",
      through: [
        [14, 15],
        [9, 15],
        [9, 11],
      ],
    },
    { draw: "dot", at: [9, 15] },
    { draw: "part", part: "rq2", symbol: "resistor", from: [9, 15], to: [9, 19], nodes: ["q", "0"] },
    { draw: "ground", at: [9, 19] },
  ],
};
