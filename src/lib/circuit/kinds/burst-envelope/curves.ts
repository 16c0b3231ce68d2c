import type { Curve, Line } from "../../stage/curve.ts";
import { analyse, type BurstState } from "./analyse.ts";

const time = { quantity: "Time", unit: "s", scale: "linear" } as const;
const floorDb = -100;

/** The share of the peak at a time: the larger of the hits' decay and the tail, as two diodes would join them. */
function shares(state: BurstState): {
  all: (x: number) => number;
  hits: (x: number) => number;
  tail: (x: number) => number;
} {
  const { hitTimes = [], hitTimeConstant, tailTimeConstant, tailStart } = analyse(state);
  const hits = (x: number) => {
    const last = hitTimes.findLast((t) => t <= x);
    return last === undefined ? 0 : Math.exp((last - x) / hitTimeConstant!);
  };
  const tail = (x: number) =>
    tailStart === undefined || x < tailStart ? 0 : Math.exp((tailStart - x) / tailTimeConstant!);
  return { all: (x) => Math.max(hits(x), tail(x)), hits, tail };
}

/** The burst and a third of the tail's 60 dB, on a whole 1-2-5 step. */
function domain(state: BurstState): readonly [number, number] {
  const { gateLength = 0, tailDecayTime60 } = analyse(state);
  const end = gateLength + tailDecayTime60! / 3;
  const decade = 10 ** Math.floor(Math.log10(end));
  return [0, [1, 2, 5, 10].find((m) => m * decade >= end * (1 - 1e-9))! * decade];
}

const lines = (state: BurstState, drawn: (share: number) => number): Line[] => {
  const { all, hits, tail } = shares(state);
  return [
    { id: "now", label: "burst and tail", at: (x) => drawn(all(x)) },
    { id: "hits", label: "hits alone", at: (x) => drawn(hits(x)) },
    { id: "tail", label: "tail alone", at: (x) => drawn(tail(x)) },
  ];
};

const mark = (state: BurstState) => {
  const { tailStart } = analyse(state);
  return tailStart === undefined ? undefined : { x: tailStart, label: "tail starts" };
};

export const curves: readonly Curve<BurstState>[] = [
  {
    id: "envelope",
    name: "Envelope",
    x: time,
    y: { quantity: "Voltage", unit: "V", scale: "linear" },
    domain,
    defined: [0, Infinity],
    lines: (state) => lines(state, (share) => share * state.conditions.hitHeight),
    mark,
  },
  {
    id: "envelope-db",
    name: "Envelope in decibels",
    x: time,
    y: { quantity: "Level under the peak", unit: "dB", scale: "linear" },
    domain,
    defined: [0, Infinity],
    lines: (state) => lines(state, (share) => Math.max(floorDb, 20 * Math.log10(share))),
    mark,
  },
];
