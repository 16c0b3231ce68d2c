import type { DrawnItem, Network } from "../../stage/network.ts";
import { paths, type Path } from "./fields.ts";

/** Rows of the inputs, from the top. */
const rowOf = (path: Path) => 6 + 3 * (path - 1);
const [first, last] = [rowOf(1), rowOf(8)];

const inputs = paths.flatMap((path): DrawnItem[] => {
  const y = rowOf(path);
  return [
    { draw: "port", at: [1, y], label: `in ${path}`, side: "left" },
    {
      draw: "wire",
      through: [
        [1, y],
        [3, y],
      ],
    },
    { draw: "part", part: `r${path}`, symbol: "resistor", from: [3, y], to: [7, y], nodes: [`in${path}`, "m"] },
    {
      draw: "wire",
      through: [
        [7, y],
        [9, y],
      ],
    },
    ...(y > first && y < last ? [{ draw: "dot", at: [9, y] } as const] : []),
  ];
});

/** Eight paths meet at the inverting input. */
export const network: Network = {
  width: 21,
  height: last + 2,
  items: [
    ...inputs,
    {
      draw: "wire",
      through: [
        [9, first],
        [9, last],
      ],
    },
    { draw: "dot", at: [9, first] },
    {
      draw: "wire",
      through: [
        [9, first],
        [13, first],
      ],
    },
    {
      draw: "wire",
      through: [
        [9, first],
        [9, 1],
        [11, 1],
      ],
    },
    { draw: "dot", at: [9, 4] },
    {
      draw: "wire",
      through: [
        [9, 4],
        [11, 4],
      ],
    },
    { draw: "part", part: "cf", symbol: "capacitor", from: [11, 1], to: [15, 1], nodes: ["o", "m"] },
    { draw: "part", part: "rf", symbol: "resistor", from: [11, 4], to: [15, 4], nodes: ["o", "m"] },
    {
      draw: "wire",
      through: [
        [15, 1],
        [18, 1],
        [18, 7],
      ],
    },
    {
      draw: "wire",
      through: [
        [15, 4],
        [18, 4],
      ],
    },
    { draw: "dot", at: [18, 4] },
    { draw: "op-amp", name: "U", at: [17, 7], nodes: { plus: "0", minus: "m", out: "o" } },
    {
      draw: "wire",
      through: [
        [13, 8],
        [13, 10],
      ],
    },
    { draw: "ground", at: [13, 10] },
    {
      draw: "wire",
      through: [
        [17, 7],
        [20, 7],
      ],
    },
    { draw: "dot", at: [18, 7] },
    { draw: "port", at: [20, 7], label: "out", side: "right" },
  ],
};
