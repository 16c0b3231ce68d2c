import type { Network } from "../../../../stage/network.ts";

export const network: Network = {
  width: 22,
  height: 14,
  items: [
    { draw: "port", at: [1, 6], label: "jack", side: "left" },
    { draw: "part", part: "rin", symbol: "resistor", from: [1, 6], to: [6, 6], nodes: ["jack", "p"] },
    { draw: "dot", at: [8, 6] },
    { draw: "node", at: [8, 6], label: "p" },
    {
      draw: "wire",
      through: [
        [6, 6],
        [14, 6],
      ],
    },
    {
      draw: "wire",
      through: [
        [8, 6],
        [8, 3],
        [10, 3],
      ],
    },
    { draw: "part", part: "rh", symbol: "resistor", from: [10, 3], to: [14, 3], nodes: ["o", "p"] },
    {
      draw: "wire",
      through: [
        [14, 3],
        [19, 3],
        [19, 7],
      ],
    },
    { draw: "op-amp", name: "U", at: [18, 7], plusAbove: true, nodes: { plus: "p", minus: "r", out: "o" } },
    {
      draw: "wire",
      through: [
        [18, 7],
        [21, 7],
      ],
    },
    { draw: "dot", at: [19, 7] },
    { draw: "rail", at: [5, 7], label: "V+" },
    { draw: "part", part: "rr1", symbol: "resistor", from: [5, 7], to: [5, 10], nodes: ["vp", "r"] },
    { draw: "dot", at: [5, 10] },
    { draw: "part", part: "rr2", symbol: "resistor", from: [5, 10], to: [5, 13], nodes: ["r", "0"] },
    { draw: "ground", at: [5, 13] },
    {
      draw: "wire",
      through: [
        [5, 10],
        [12, 10],
        [12, 8],
        [14, 8],
      ],
    },
    { draw: "port", at: [21, 7], label: "pulse", side: "right" },
  ],
};
