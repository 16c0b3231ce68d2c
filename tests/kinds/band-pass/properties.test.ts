import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { designExactly, isRefusal, solveStage, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { idealResistors, largestGain } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/model.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { conditionsOf, logarithmic, partsOf, runs, targetsOf } from "../../support/random.ts";

const results = (parts: PlainValues, conditions: PlainConditions = {}) =>
  analyseChange(multipleFeedback, { parts, conditions }).results as Record<string, number>;

/** Parts whose ideal response is read well: any with resistors of 100 Ω to 1 MΩ. */
const resistor = logarithmic(100, 1e6);
const capacitor = logarithmic(470e-12, 470e-9);
const anyParts = fc.record({
  ra: resistor,
  rb: resistor,
  rbPot: fc.oneof(fc.constant(0), logarithmic(100, 1e5)),
  rf: resistor,
  c1: capacitor,
  c2: capacitor,
});

describe("the multiple-feedback band-pass", () => {
  it("gives the closed forms with an ideal op amp", () => {
    fc.assert(
      fc.property(anyParts, (given) => {
        const parts = { ...given, rbPot: 0 };
        const { ra, rb, rf, c1, c2 } = parts;
        const got = results(parts);
        const bandwidth = (c1 + c2) / (2 * Math.PI * c1 * c2 * rf);
        const centre = Math.sqrt((1 / ra + 1 / rb) / (rf * c1 * c2)) / (2 * Math.PI);
        expectRelative(got["centreFrequency"], centre, 1e-12, "centre");
        expectRelative(got["peakGain"], ((rf / ra) * c2) / (c1 + c2), 1e-12, "peak gain");
        expectRelative(got["noiseBandwidth"], (Math.PI / 2) * bandwidth, 1e-11, "noise bandwidth");
        // Below this the −3 dB points lie so far apart that their difference is all there is to lose digits.
        expectRelative(got["bandwidth"], bandwidth, 1e-9, "bandwidth");
      }),
      runs(300),
    );
  });

  it("is sized exactly for any pair of capacitors, with an ideal op amp", () => {
    fc.assert(
      fc.property(targetsOf(multipleFeedback), capacitor, logarithmic(0.2, 5), (targets, c1, ratio) => {
        const { centreFrequency, qualityFactor, peakGain } = targets as Record<string, number>;
        const c2 = c1 * ratio;
        const exact = idealResistors(centreFrequency!, qualityFactor!, peakGain!, c1, c2);
        expect(exact.rb > 0).toBe(peakGain! < largestGain(qualityFactor!, c1, c2));
        if (exact.rb <= 0) return;
        const got = results({ ...exact, rbPot: 0, c1, c2 });
        // Near its limit RB takes up what is left of two nearly equal conductances.
        for (const [key, wanted] of Object.entries(targets)) expectRelative(got[key], wanted, 1e-9, key);
      }),
      runs(300),
    );
  });

  it("meets its targets under any conditions, or says which one to change", () => {
    const outcomes: string[] = [];
    fc.assert(
      fc.property(targetsOf(multipleFeedback), conditionsOf(multipleFeedback), capacitor, (targets, conditions, c) => {
        const parts = designExactly(multipleFeedback, targets, conditions, { c1: c, c2: c });
        outcomes.push(isRefusal(parts) ? parts.field : "met");
        if (isRefusal(parts)) return;
        const got = results(parts, conditions);
        for (const [key, wanted] of Object.entries(targets)) expectRelative(got[key], wanted, 1e-9, key);
      }),
      runs(300),
    );
    expect(outcomes.filter((outcome) => outcome === "met").length).toBeGreaterThan(100);
    expect(outcomes).toContain("peakGain");
  });

  it("says what to change where 2Q² does not exceed the gain, and following it helps", () => {
    const targets = { centreFrequency: 1000, qualityFactor: 1, peakGain: 2 };
    const refusal = solveStage(multipleFeedback, { targets });
    if (!("refused" in refusal)) throw new Error("2Q² = |H0| must be refused");
    expect(refusal.field).toBe("peakGain");
    const [, gain, quality] =
      /under ([\d.]+), or raise the quality factor above ([\d.]+)\./.exec(refusal.message) ?? [];
    expect(solveStage(multipleFeedback, { targets: { ...targets, peakGain: Number(gain) } })).not.toHaveProperty(
      "refused",
    );
    expect(
      solveStage(multipleFeedback, { targets: { ...targets, qualityFactor: Number(quality) } }),
    ).not.toHaveProperty("refused");
  });

  it("keeps bandwidth, peak gain and noise while the pot is turned, with an ideal op amp", () => {
    const turn = fc.integer({ min: 0, max: 1000 }).map((k) => k / 1000);
    const law = fc.constantFrom("linear", "logarithmic", "reverse-logarithmic");
    fc.assert(
      fc.property(anyParts, turn, turn, law, logarithmic(1, 1e5), (given, a, b, potLaw, sourceResistance) => {
        const parts = { ...given, rbPot: 5e3 };
        const [one, other] = [a, b].map((rotation) =>
          results(parts, { rotation, potLaw, sourceResistance, sourceRms: 1 }),
        );
        for (const key of ["bandwidth", "peakGain", "noiseBandwidth", "outputRms"])
          expectRelative(one![key], other![key]!, 1e-9, key);
        if (a < b) expect(one!["centreFrequency"]!).toBeGreaterThanOrEqual(other!["centreFrequency"]!);
      }),
      runs(200),
    );
  });

  it("ends its retune range where the pot ends", () => {
    fc.assert(
      fc.property(anyParts, conditionsOf(multipleFeedback), (given, conditions) => {
        const parts = { ...given, rbPot: 10e3 };
        const got = results(parts, conditions);
        const ends = [results(parts, { ...conditions, rotation: 1 }), results(parts, { ...conditions, rotation: 0 })];
        // A peak without −3 dB points has a place in the range, and no centre of its own.
        for (const [i, key] of ["retuneLow", "retuneHigh"].entries())
          if (ends[i]!["centreFrequency"] !== undefined)
            expectRelative(got[key], ends[i]!["centreFrequency"], 1e-12, key);
        if (got["retuneLow"] === undefined || got["retuneHigh"] === undefined) return;
        expectRelative(got["retuneSpan"], 12 * Math.log2(got["retuneHigh"] / got["retuneLow"]), 1e-9, "span");
      }),
      runs(100),
    );
  });

  it("scales: resistors up and capacitors down leave it alone, capacitors alone move it", () => {
    const factor = logarithmic(0.1, 10);
    const scaled = (parts: PlainValues, r: number, c: number) =>
      Object.fromEntries(Object.entries(parts).map(([key, value]) => [key, value * (key.startsWith("c") ? c : r)]));
    fc.assert(
      fc.property(anyParts, factor, (parts, k) => {
        const before = results(parts);
        const sameCentre = results(scaled(parts, k, 1 / k));
        const moved = results(scaled(parts, 1, k));
        for (const key of ["centreFrequency", "qualityFactor", "peakGain"])
          expectRelative(sameCentre[key], before[key]!, 1e-9, key);
        expectRelative(moved["centreFrequency"], before["centreFrequency"]! / k, 1e-11, "centre");
        expectRelative(moved["qualityFactor"], before["qualityFactor"]!, 1e-9, "quality factor");
        expectRelative(moved["peakGain"], before["peakGain"]!, 1e-11, "peak gain");
      }),
      runs(200),
    );
  });

  it("tends to the ideal as the op amp gets faster, the error falling in proportion", () => {
    const { parts, conditions } = {
      parts: { ra: 22e3, rb: 3200, rbPot: 0, rf: 100e3, c1: 10e-9, c2: 10e-9 },
      conditions: {},
    };
    const ideal = results(parts, conditions);
    const errors = [1e6, 1e7, 1e8, 1e9].map((gainBandwidth) => {
      const got = results(parts, { gainBandwidth });
      return got["centreFrequency"]! / ideal["centreFrequency"]! - 1;
    });
    for (const [i, error] of errors.slice(1).entries()) expect(error / errors[i]!).toBeCloseTo(0.1, 2);
    // First order: −Q·f0/ft.
    expectRelative(errors[3], (-ideal["qualityFactor"]! * ideal["centreFrequency"]!) / 1e9, 1e-3, "first-order shift");
  });

  it("counts a source resistance as a part of RA", () => {
    fc.assert(
      fc.property(anyParts, logarithmic(1, 1e5), conditionsOf(multipleFeedback), (parts, rs, conditions) => {
        const [inFront, merged] = [
          results(parts, { ...conditions, sourceResistance: rs }),
          results({ ...parts, ra: parts.ra + rs }, { ...conditions, sourceResistance: 0 }),
        ];
        for (const key of ["centreFrequency", "qualityFactor", "peakGain", "noiseGain"])
          expect(inFront[key], key).toBe(merged[key]);
      }),
      runs(100),
    );
  });

  it("stays finite with every part and condition at either end of what is accepted", () => {
    fc.assert(
      fc.property(partsOf(multipleFeedback, 1000), conditionsOf(multipleFeedback, 1000), (parts, conditions) => {
        for (const [key, value] of Object.entries(results(parts, conditions)))
          expect(Number.isFinite(value), `${key} = ${value}`).toBe(true);
      }),
      runs(300),
    );
  });
});
