import type { DrawnItem, Network } from "../../../stage/network.ts";

/** The two emitters up to the rail: through resistors, or straight. */
function emitters(degenerated: boolean): DrawnItem[] {
  if (!degenerated)
    return [
      {
        draw: "wire",
        through: [
          [6, 4],
          [6, 2],
        ],
      },
      {
        draw: "wire",
        through: [
          [14, 4],
          [14, 2],
        ],
      },
    ];
  return [
    { draw: "part", part: "r1", symbol: "resistor", from: [6, 2], to: [6, 4], nodes: ["vp", "e1"] },
    { draw: "part", part: "r2", symbol: "resistor", from: [14, 2], to: [14, 4], nodes: ["vp", "e2"] },
  ];
}

/** A pair of PNP transistors, back to back, hanging from the positive rail. */
export function pairNetwork(degenerated: boolean): Network {
  const [e1, e2] = degenerated ? ["e1", "e2"] : ["vp", "vp"];
  return {
    width: 19,
    height: 14,
    items: [
      { draw: "rail", at: [6, 2], label: "V+" },
      { draw: "rail", at: [14, 2], label: "V+" },
      ...emitters(degenerated),
      {
        draw: "transistor",
        name: "Q1",
        polarity: "pnp",
        at: [8, 6],
        facing: "left",
        nodes: { base: "b", collector: "b", emitter: e1! },
      },
      {
        draw: "transistor",
        name: "Q2",
        polarity: "pnp",
        at: [12, 6],
        nodes: { base: "b", collector: "o", emitter: e2! },
      },
      {
        draw: "wire",
        through: [
          [8, 6],
          [12, 6],
        ],
      },
      { draw: "dot", at: [9, 6] },
      {
        draw: "wire",
        through: [
          [9, 6],
          [9, 8],
          [6, 8],
        ],
      },
      { draw: "dot", at: [6, 8] },
      { draw: "node", at: [6, 8], label: "b" },
      {
        draw: "wire",
        through: [
          [6, 8],
          [6, 9],
        ],
      },
      { draw: "source", name: "I_ref", sort: "current", from: [6, 9], to: [6, 13], nodes: ["b", "0"] },
      { draw: "ground", at: [6, 13] },
      {
        draw: "wire",
        through: [
          [14, 8],
          [14, 10],
          [18, 10],
        ],
      },
      { draw: "port", at: [18, 10], label: "out", side: "right" },
    ],
  };
}
