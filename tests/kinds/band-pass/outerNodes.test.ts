import fc from "fast-check";
import { describe, it } from "vitest";
import { completeConditions, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { logarithmic } from "../../support/random.ts";
import { nodalResponse, topologyOf } from "./networks.ts";

/**
 * The outer nodes of two integrators with three real op amps are of fifth order, behind the source's own pole of sixth.
 * What the library reads off those coefficients in closed form is compared with sums over the nodal response.
 */
const topology = topologyOf("two-integrator");

/** A loop that is well damped, so that an even grid resolves it. */
const loop = fc.record({
  r1: logarithmic(5e3, 50e3),
  r2: logarithmic(5e3, 50e3),
  ra: logarithmic(5e3, 20e3),
  rb: logarithmic(5e3, 20e3),
  ri: logarithmic(5e3, 50e3),
  rq1: logarithmic(10e3, 60e3),
  c1: logarithmic(2e-9, 20e-9),
  c2: logarithmic(2e-9, 20e-9),
});
const around = fc.record({
  gainBandwidth: logarithmic(1e6, 10e6),
  openLoopGain: logarithmic(1e5, 1e6),
  sourceResistance: logarithmic(100, 5e3),
  sourceBandwidth: logarithmic(5e3, 100e3),
});

/** Each point is a system of equations solved by mathjs. */
const gridPoints = 280;

const outerNodes = [
  ["hp", "highPassRms", "highPassPeak"],
  ["lp", "lowPassRms", "lowPassPeak"],
] as const;

/** |H|² of one node on a grid even in ln f, from 1 Hz to far past the op amps. */
function powers(
  parts: PlainValues,
  conditions: PlainConditions,
  node: string,
  from: number,
  to: number,
  count: number,
) {
  const response = nodalResponse(topology, parts, completeConditions(topology, conditions), node);
  const step = Math.log(to / from) / count;
  return Array.from({ length: count + 1 }, (_, i) => {
    const frequency = from * Math.exp(i * step);
    const { re, im } = response(frequency);
    return { frequency, step, power: re * re + im * im };
  });
}

/** The greatest |H| of a node: the highest point of the grid, then the peak between its neighbours cut by thirds. */
function highest(parts: PlainValues, conditions: PlainConditions, node: string): number {
  const grid = powers(parts, conditions, node, 1, 1e8, gridPoints);
  const top = grid.reduce((best, point) => (point.power > best.power ? point : best));
  const response = nodalResponse(topology, parts, completeConditions(topology, conditions), node);
  const size = (x: number) => {
    const { re, im } = response(Math.exp(x));
    return Math.hypot(re, im);
  };
  let [low, high] = [Math.log(top.frequency) - top.step, Math.log(top.frequency) + top.step];
  for (let k = 0; k < 24; k++) {
    const [a, b] = [low + (high - low) / 3, high - (high - low) / 3];
    if (size(a) < size(b)) low = a;
    else high = b;
  }
  // A low-pass that hardly rings stands highest at DC.
  return Math.max(size(Math.log(1e-3)), size((low + high) / 2));
}

describe("the outer nodes of two integrators with real op amps", () => {
  it("pass as much noise as the nodal response does, the source's pole included", () => {
    fc.assert(
      fc.property(loop, around, (some, given) => {
        const conditions = { ...given, sourceRms: 1 };
        const parts = { ...topologyDefaults(), ...some };
        const { results } = analyseChange(topology, { parts, conditions });
        const density = 1 / Math.sqrt((Math.PI / 2) * given.sourceBandwidth);
        for (const [node, level] of outerNodes) {
          const grid = powers(parts, conditions, node, 1, 1e8, gridPoints);
          const terms = grid.map(
            ({ frequency, power }) => (power * frequency) / (1 + (frequency / given.sourceBandwidth) ** 2),
          );
          // The trapezoidal rule in ln f: both ends have fallen to nothing, or to a constant density below 1 Hz.
          const sum = terms.reduce((total, term) => total + term, 0) * grid[0]!.step + grid[0]!.power;
          expectRelative(results[level], density * Math.sqrt(sum), 1e-5, `${node} noise`);
        }
      }),
      { numRuns: 2, seed: 11, endOnFailure: true },
    );
  });

  it("peak as high as the nodal response does", () => {
    fc.assert(
      fc.property(loop, around, (some, conditions) => {
        const parts = { ...topologyDefaults(), ...some };
        const { results } = analyseChange(topology, { parts, conditions });
        for (const [node, , peak] of outerNodes)
          expectRelative(results[peak], highest(parts, conditions, node), 1e-8, `${node} peak`);
      }),
      { numRuns: 2, seed: 11, endOnFailure: true },
    );
  });
});

function topologyDefaults(): PlainValues {
  return Object.fromEntries(Object.entries(topology.parts).map(([key, field]) => [key, field.default]));
}
