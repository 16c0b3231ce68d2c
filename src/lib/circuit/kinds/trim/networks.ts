import type { Network } from "../../stage/network.ts";

export const rheostatNetwork: Network = {
  width: 16,
  height: 6,
  items: [
    { draw: "port", at: [1, 3], label: "a", side: "left" },
    {
      draw: "wire",
      through: [
        [1, 3],
        [2, 3],
      ],
    },
    { draw: "part", part: "rFixed", symbol: "resistor", from: [2, 3], to: [6, 3], nodes: ["a", "b"] },
    { draw: "node", at: [7, 3], label: "b" },
    {
      draw: "wire",
      through: [
        [6, 3],
        [8, 3],
      ],
    },
    { draw: "part", part: "rPot", symbol: "rheostat", from: [8, 3], to: [13, 3], nodes: ["b", "c"] },
    {
      draw: "wire",
      through: [
        [13, 3],
        [15, 3],
      ],
    },
    { draw: "port", at: [15, 3], label: "c", side: "right" },
  ],
};

export const dividerNetwork: Network = {
  width: 14,
  height: 17,
  items: [
    { draw: "port", at: [2, 1], label: "reference", side: "left" },
    {
      draw: "wire",
      through: [
        [2, 1],
        [5, 1],
        [5, 2],
      ],
    },
    { draw: "part", part: "rTop", symbol: "resistor", from: [5, 2], to: [5, 6], nodes: ["ref", "h"] },
    { draw: "node", at: [5, 6], label: "h" },
    { draw: "pot", part: "rPot", from: [5, 6], to: [5, 11], wiper: [8, 8.5], nodes: ["h", "l", "w"] },
    {
      draw: "wire",
      through: [
        [8, 8.5],
        [12, 8.5],
      ],
    },
    { draw: "port", at: [12, 8.5], label: "wiper", side: "right" },
    { draw: "node", at: [5, 11], label: "l" },
    { draw: "part", part: "rBottom", symbol: "resistor", from: [5, 11], to: [5, 15], nodes: ["l", "0"] },
    { draw: "ground", at: [5, 15] },
  ],
};
