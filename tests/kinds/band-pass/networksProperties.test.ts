import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { PlainConditions, PlainValues } from "#lib/circuit/index.ts";
import { bandPass } from "#lib/circuit/kinds/band-pass/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";
import { topologyOf } from "./networks.ts";

const results = (id: string, parts: PlainValues, conditions: PlainConditions = {}) =>
  analyseChange(topologyOf(id), { parts, conditions }).results as Record<string, number>;

const resistor = logarithmic(1e3, 1e6);
const capacitor = logarithmic(1e-9, 100e-9);
const turn = fc.integer({ min: 0, max: 100 }).map((k) => k / 100);
const law = fc.constantFrom("linear", "logarithmic", "reverse-logarithmic");

describe("two integrators", () => {
  it("keep Q, peak gain and the ratio of bandwidth to centre while equal gangs turn", () => {
    fc.assert(
      fc.property(resistor, resistor, capacitor, turn, turn, law, (r, pot, c, a, b, potLaw) => {
        const parts = { r1: r, r2: r, r1Pot: pot, r2Pot: pot, c1: c, c2: c };
        const [one, other] = [a, b].map((rotation) => results("two-integrator", parts, { rotation, potLaw }));
        for (const key of ["qualityFactor", "peakGain", "highPassPeak"])
          expectRelative(one![key], other![key]!, 1e-9, key);
        if (a < b) expect(one!["centreFrequency"]!).toBeGreaterThanOrEqual(other!["centreFrequency"]!);
      }),
      runs(60),
    );
  });

  it("change Q by the gangs' mismatch, by its square root at the most", () => {
    const parts = { r1: 10, r2: 10, r1Pot: 100e3, r2Pot: 100e3 };
    const [even, uneven] = [0, 3].map((gangMismatch) =>
      results("two-integrator", parts, { gangMismatch, rotation: 1 }),
    );
    // Q goes with √(R1/R2).
    expectRelative(uneven!["qualityFactor"]! / even!["qualityFactor"]!, 10 ** (-3 / 40), 1e-3, "Q");
  });

  it("oscillate where the first-order law says, for a small f0/ft", () => {
    const quality = (q: number) =>
      results(
        "two-integrator",
        { r1: 159.2e3, r2: 159.2e3, rq2: 100, rq1: 100 * (3 * q - 1) },
        { gainBandwidth: 100e3 },
      )["qualityFactor"];
    const most = results("two-integrator", { r1: 159.2e3, r2: 159.2e3 }, { gainBandwidth: 100e3 })["qualityLimit"]!;
    expect(quality(0.97 * most)).toBeGreaterThan(10 * most);
    expect(quality(1.03 * most)).toBeUndefined();
  });
});

describe("the bridged T", () => {
  it("keeps its ring time while the pitch pot turns, with an ideal op amp", () => {
    fc.assert(
      fc.property(logarithmic(100, 1e4), capacitor, turn, turn, (r1, c, a, b) => {
        const parts = { r1, r1Pot: 5e3, c1: c, c2: c };
        const [one, other] = [a, b].map((rotation) => results("bridged-t", parts, { rotation }));
        expectRelative(one!["ringTime60"], other!["ringTime60"]!, 1e-9, "ring time");
        if (a < b) expect(one!["centreFrequency"]!).toBeGreaterThan(other!["centreFrequency"]!);
      }),
      runs(60),
    );
  });

  it("rings in proportion to the strike's height, and to its width while that is short", () => {
    const peak = (strikeVoltage: number, strikeWidth: number) =>
      results("bridged-t", {}, { strikeVoltage, strikeWidth })["ringPeak"]!;
    expectRelative(peak(10, 1e-3), 2 * peak(5, 1e-3), 1e-12, "height");
    expectRelative(peak(5, 20e-6), 2 * peak(5, 10e-6), 2e-3, "width");
  });
});

describe("the passive network", () => {
  it("never has a Q of one half, and approaches it as its second half gets lighter", () => {
    fc.assert(
      fc.property(partsOf(topologyOf("passive")), (parts) => {
        expect(results("passive", parts)["qualityFactor"]!).toBeLessThan(0.5);
      }),
      runs(150),
    );
    const light = { r1: 1e3, c1: 100e-9, r2: 1e6, c2: 100e-12 };
    expect(results("passive", light)["qualityFactor"]).toBeCloseTo(0.5, 3);
  });
});

describe("Sallen-Key", () => {
  it("loses its centre to the op amp as the first-order law says", () => {
    const ideal = results("sallen-key", {});
    const real = results("sallen-key", {}, { gainBandwidth: 300e6 });
    const shift = real["centreFrequency"]! / ideal["centreFrequency"]! - 1;
    expectRelative(shift, (-(3.4 ** 2) * ideal["centreFrequency"]!) / (2 * Math.SQRT2 * 300e6), 2e-3, "shift");
  });
});

describe.each(bandPass.topologies.map(({ id }) => id))("the %s network", (id) => {
  const topology = topologyOf(id);

  it("scales: resistors up and capacitors down leave it alone", () => {
    fc.assert(
      fc.property(logarithmic(0.2, 5), (k) => {
        const start = Object.fromEntries(
          Object.entries(topology.parts).map(([key, { default: value }]) => [key, value]),
        );
        const scaled = Object.fromEntries(
          Object.entries(start).map(([key, value]) => [key, key.startsWith("c") ? value / k : value * k]),
        );
        for (const key of ["centreFrequency", "qualityFactor", "peakGain", "noiseBandwidth"])
          expectRelative(results(id, scaled)[key], results(id, start)[key]!, 1e-9, key);
      }),
      runs(20),
    );
  });

  it("stays finite with every part and condition at either end of what is accepted", () => {
    fc.assert(
      fc.property(partsOf(topology, 1000), conditionsOf(topology, 1000), (parts, conditions) => {
        for (const [key, value] of Object.entries(results(id, parts, conditions)))
          expect(Number.isFinite(value), `${key} = ${value}`).toBe(true);
      }),
      runs(100),
    );
  });
});
