import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { completeConditions, plotStage } from "#lib/circuit/index.ts";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { bandPass } from "#lib/circuit/kinds/band-pass/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";
import { nodalResponse, topologyOf, transfers } from "./networks.ts";

/** H(j2πf) off the coefficients, as a complex pair. */
function transferValue(
  topology: AnyTopology,
  parts: Record<string, number>,
  given: object,
  frequency: number,
): [number, number] {
  const conditions = completeConditions(topology, given as never);
  const { numerator, denominator } = transfers[topology.id]!({ parts, conditions });
  const at = (p: readonly number[]): [number, number] => {
    const omega = 2 * Math.PI * frequency;
    return p.reduceRight<[number, number]>(([re, im], c) => [c - im * omega, re * omega], [0, 0]);
  };
  const [a, b] = at(numerator);
  const [c, d] = at(denominator);
  const squared = c * c + d * d;
  return [(a * c + b * d) / squared, (b * c - a * d) / squared];
}

const frequencies = fc.array(logarithmic(1, 1e6), { minLength: 8, maxLength: 8 });

/** What rounding leaves of a nodal solution with a source of 1 V; far skirts lie below it. */
const floor = 1e-11;

/** The node that is the output in the drawing. */
const outputNode: Record<string, string> = { "two-integrator": "bp" };

describe.each(bandPass.topologies.map((topology) => [topology.id, topology] as const))(
  "the %s band-pass against nodal analysis of its drawn network",
  (id, topology) => {
    const nodalOf = (parts: Record<string, number>, given: object) =>
      nodalResponse(topology, parts, given as never, outputNode[id]);

    it.each([
      ["ideal op amps", null],
      ["single-pole op amps", 3e6],
    ] as const)("gives the same response with %s, over random parts and surroundings", (_, gainBandwidth) => {
      fc.assert(
        fc.property(partsOf(topology), conditionsOf(topology), frequencies, (parts, conditions, at) => {
          // A network without op amps has no such condition, and is checked twice.
          const speed = gainBandwidth === null ? null : (conditions["gainBandwidth"] ?? gainBandwidth);
          const given = { ...conditions, ...("gainBandwidth" in topology.conditions && { gainBandwidth: speed }) };
          const nodal = nodalOf(parts, given);
          for (const frequency of at) {
            const expected = nodal(frequency);
            const [re, im] = transferValue(topology, parts, given, frequency);
            const size = Math.hypot(expected.re, expected.im);
            const error = Math.hypot(re - expected.re, im - expected.im);
            expect(error, `${frequency} Hz`).toBeLessThan(1e-9 * size + floor);
          }
        }),
        runs(60),
      );
    });

    it("draws its curves through the same points", () => {
      fc.assert(
        fc.property(partsOf(topology), conditionsOf(topology), frequencies, (parts, conditions, at) => {
          const nodal = nodalOf(parts, conditions);
          const lines = plotStage(topology, { parts, conditions, curves: ["magnitude", "phase"], at });
          const now = (curve: string) => lines.find((line) => line.id === curve && line.line === "now")!.points;
          for (const [i, frequency] of at.entries()) {
            const { re, im } = nodal(frequency);
            const size = Math.hypot(re, im);
            const allowed = 1e-9 + floor / size;
            expectRelative(10 ** (now("magnitude")[i]![1] / 20), size, allowed, `|H| at ${frequency} Hz`);
            const turned = (now("phase")[i]![1] - (Math.atan2(im, re) * 180) / Math.PI) / 360;
            expect(Math.abs(turned - Math.round(turned)) * 360, `phase at ${frequency} Hz`).toBeLessThan(
              1e-6 + (360 * floor) / size,
            );
          }
        }),
        runs(40),
      );
    });
  },
);

describe("the other outputs of two integrators", () => {
  it.each(["high-pass", "low-pass"])("has the nodal response at the %s one", (name) => {
    const topology = topologyOf("two-integrator");
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), frequencies, (parts, conditions, at) => {
        const nodal = nodalResponse(topology, parts, conditions, name === "high-pass" ? "hp" : "lp");
        const line = plotStage(topology, { parts, conditions, curves: ["outputs"], at }).find(
          (one) => one.line === name,
        )!;
        for (const [i, frequency] of at.entries()) {
          const { re, im } = nodal(frequency);
          const size = Math.hypot(re, im);
          expectRelative(10 ** (line.points[i]![1] / 20), size, 1e-9 + floor / size, `${frequency} Hz`);
        }
      }),
      runs(60),
    );
  });
});
