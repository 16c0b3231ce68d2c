import type { Network } from "../../stage/network.ts";

/** The pulse enters on the left; the discharge hangs from the capacitor, and a buffer hides the load. */
export const network: Network = {
  width: 24,
  height: 12,
  items: [
    { draw: "port", at: [1, 4], label: "pulse", side: "left" },
    { draw: "part", part: "rs", symbol: "resistor", from: [1, 4], to: [5, 4], nodes: ["p", "d"] },
    { draw: "diode", name: "D", from: [5, 4], to: [8, 4], nodes: ["d", "env"] },
    {
      draw: "wire",
      through: [
        [8, 4],
        [18, 4],
      ],
    },
    { draw: "dot", at: [9, 4] },
    { draw: "part", part: "c", symbol: "capacitor", from: [9, 4], to: [9, 9], nodes: ["env", "0"] },
    { draw: "ground", at: [9, 9] },
    { draw: "dot", at: [14, 4] },
    { draw: "node", at: [14, 4], label: "env" },
    { draw: "part", part: "rMin", symbol: "resistor", from: [14, 4], to: [14, 7], nodes: ["env", "w"] },
    { draw: "part", part: "rPot", symbol: "rheostat", from: [14, 7], to: [14, 10], nodes: ["w", "0"] },
    { draw: "ground", at: [14, 10] },
    { draw: "op-amp", name: "U", at: [22, 5], plusAbove: true, nodes: { plus: "env", minus: "o", out: "o" } },
    {
      draw: "wire",
      through: [
        [18, 6],
        [17, 6],
        [17, 8],
        [22, 8],
        [22, 5],
      ],
    },
    { draw: "dot", at: [22, 5] },
    {
      draw: "wire",
      through: [
        [22, 5],
        [23, 5],
      ],
    },
    { draw: "port", at: [23, 5], label: "envelope", side: "right" },
  ],
};
