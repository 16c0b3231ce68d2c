import {
  analyseStage,
  defaultParts,
  defaultTargets,
  plotStage,
  spacedValues,
  type AnyTopology,
  type PlainConditions,
  type StageKind,
} from "#lib/circuit/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { nodalResponse } from "../kinds/band-pass/networks.ts";

const pointsOfCurve = 400;

export const subject = {
  parts: { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 },
  conditions: { gainBandwidth: 3e6, sourceResistance: 1e3, loadResistance: 10e3 } satisfies PlainConditions,
  targets: { centreFrequency: 1000, qualityFactor: 3, peakGain: 2 },
};

const axis = { quantity: "Frequency", unit: "Hz", scale: "logarithmic" } as const;
const at = spacedValues(axis, [100, 10e3], pointsOfCurve);

/** A part that differs each time, so that no result could have been kept from the time before. */
const varied = (turn: number) => ({ ...subject.parts, ra: subject.parts.ra * (1 + (turn % 1000) * 1e-6) });

export const work: Record<string, (turn: number) => unknown> = {
  analyse: (turn) => analyseStage(multipleFeedback, { ...subject, parts: varied(turn) }),
  "400-point curve": (turn) =>
    plotStage(multipleFeedback, { ...subject, parts: { ...varied(turn), rbPot: 0 }, curves: ["magnitude"], at }),
  "400-point curve through mathjs": (turn) => {
    const response = nodalResponse(multipleFeedback, { ...varied(turn), rbPot: 0 }, subject.conditions);
    return at.map((frequency) => {
      const { re, im } = response(frequency);
      return 20 * Math.log10(Math.hypot(re, im));
    });
  },
  /** What mathjs would need to read a centre and two edges to 1e-12 off the network: about 3 × 40 halvings. */
  "analyse through mathjs": (turn) => {
    const response = nodalResponse(multipleFeedback, varied(turn), subject.conditions);
    const gain = (f: number) => {
      const { re, im } = response(f);
      return Math.hypot(re, im);
    };
    const peak = halve((f) => gain(f * (1 + 1e-7)) - gain(f * (1 - 1e-7)), 100, 10e3);
    const edge = (from: number, to: number) => halve((f) => gain(f) - gain(peak) / Math.SQRT2, from, to);
    return [peak, edge(10, peak), edge(peak, 100e3)];
  },
};

const longestPerKind = 0.3;

/** Processor time of one analysis in seconds, each time with parts that differ, so that a busy machine does not decide it. */
function analysisCost(topology: AnyTopology, conditions: PlainConditions): number {
  const parts = defaultParts(topology);
  const [first] = Object.keys(parts);
  const job = (turn: number) =>
    analyseStage(topology, {
      parts: first === undefined ? parts : { ...parts, [first]: parts[first]! * (1 + (turn % 1000) * 1e-6) },
      conditions,
      targets: defaultTargets(topology),
    });
  for (let turn = 0; turn < 20; turn++) job(turn);
  const before = process.cpuUsage();
  const start = performance.now();
  let turns = 0;
  while (performance.now() - start < longestPerKind * 1000) job(turns++);
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1e6 / turns;
}

/** Every optional part of the surroundings switched on. */
const everythingOn = (topology: AnyTopology): PlainConditions =>
  Object.fromEntries(
    Object.entries(topology.conditions).map(([key, field]) => [
      key,
      field.type === "number" ? (field.suggestion ?? field.default) : field.default,
    ]),
  );

/** What an analysis of each topology costs, in an ideal world and in a real one; the dearer of the two counts. */
export function* analysisCosts(kinds: readonly StageKind[]): Generator<{ name: string; seconds: number }> {
  for (const kind of kinds)
    for (const topology of kind.topologies) {
      const seconds = Math.max(analysisCost(topology, {}), analysisCost(topology, everythingOn(topology)));
      yield { name: `${kind.id}/${topology.id}`, seconds };
    }
}

function halve(f: (x: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  const rising = f(low) < 0;
  for (let i = 0; i < 40; i++) {
    const middle = Math.sqrt(low * high);
    if (f(middle) < 0 === rising) low = middle;
    else high = middle;
  }
  return low;
}

/** Times per second over at least `seconds`, after as long a warm-up as a tenth of that. */
export function rate(job: (turn: number) => unknown, seconds: number): number {
  const run = (until: number) => {
    const start = performance.now();
    let turns = 0;
    while (performance.now() - start < until * 1000) job(turns++);
    return (turns * 1000) / (performance.now() - start);
  };
  run(seconds / 10);
  return run(seconds);
}
