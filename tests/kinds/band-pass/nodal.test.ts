import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { completeConditions, plotStage } from "#lib/circuit/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { transferAt } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/analyse.ts";
import { expectRelative } from "../../support/approx.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";
import { nodalResponse } from "./network.ts";

/** H(j2πf) off the coefficients, as a complex pair. */
function transferValue(parts: Record<string, number>, given: object, frequency: number): [number, number] {
  const conditions = completeConditions(multipleFeedback, given as never);
  const { numerator, denominator } = transferAt({ parts, conditions } as never);
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

describe("the multiple-feedback band-pass against nodal analysis of its drawn network", () => {
  it.each([
    ["an ideal op amp", { gainBandwidth: null }],
    ["a single-pole op amp", {}],
  ] as const)("gives the same response with %s, over random parts and surroundings", (_, fixed) => {
    fc.assert(
      fc.property(partsOf(multipleFeedback), conditionsOf(multipleFeedback), frequencies, (parts, conditions, at) => {
        const given = { ...conditions, gainBandwidth: conditions["gainBandwidth"] ?? 3e6, ...fixed };
        const nodal = nodalResponse(parts, given);
        for (const frequency of at) {
          const expected = nodal(frequency);
          const [re, im] = transferValue(parts, given, frequency);
          const error = Math.hypot(re - expected.re, im - expected.im) / Math.hypot(expected.re, expected.im);
          expect(error, `${frequency} Hz`).toBeLessThan(1e-9);
        }
      }),
      runs(150),
    );
  });

  it("draws its curves through the same points", () => {
    fc.assert(
      fc.property(partsOf(multipleFeedback), conditionsOf(multipleFeedback), frequencies, (parts, conditions, at) => {
        const nodal = nodalResponse(parts, conditions);
        const lines = plotStage(multipleFeedback, { parts, conditions, curves: ["magnitude", "phase"], at });
        const now = (id: string) => lines.find((line) => line.id === id && line.line === "now")!.points;
        for (const [i, frequency] of at.entries()) {
          const { re, im } = nodal(frequency);
          expectRelative(10 ** (now("magnitude")[i]![1] / 20), Math.hypot(re, im), 1e-9, `|H| at ${frequency} Hz`);
          const turned = (now("phase")[i]![1] - (Math.atan2(im, re) * 180) / Math.PI) / 360;
          expect(Math.abs(turned - Math.round(turned)) * 360, `phase at ${frequency} Hz`).toBeLessThan(1e-6);
        }
      }),
      runs(80),
    );
  });
});
