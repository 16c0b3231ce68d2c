import { computeChain, type Chain, type ComputedChain } from "#lib/circuit/voice/index.ts";
import type { AudioSignal } from "#lib/circuit/stage/signal.ts";
import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { find, linksOf, stageOf, twoPaths } from "../../support/chains.ts";

const withStage = (chain: Chain, id: string, change: Partial<Chain["stages"][number]>): Chain => ({
  ...chain,
  stages: chain.stages.map((stage) => (stage.id === id ? { ...stage, ...change } : stage)),
});
const withPart = (chain: Chain, id: string, part: string, value: number) =>
  withStage(chain, id, { parts: { ...chain.stages.find((stage) => stage.id === id)!.parts, [part]: value } });
const stage = (computed: ComputedChain, id: string) => computed.stages.get(id)!;
const result = (computed: ComputedChain, id: string, key: string) =>
  stage(computed, id).analysis.results[key] as number;

describe("what one stage computes feeds the next", () => {
  const voice = computeChain(twoPaths(), find);

  test("a pulse as high as the velocity makes it charges the envelopes", () => {
    expect(stage(voice, "envelope").conditions.pulseHeight).toBeCloseTo(1.9 * 5, 12);
    expect(stage(voice, "envelope").conditions.pulseWidth).toBe(result(voice, "trigger", "pulseWidth"));
    expect(stage(voice, "trigger").conditions.chargeTimeConstant).toBeCloseTo(470 * 1e-6, 12);
  });

  test("the envelope's peak becomes a current, is mirrored, and biases the cell", () => {
    expect(stage(voice, "converter").conditions.controlVoltage).toBe(result(voice, "envelope", "peakVoltage"));
    expect(stage(voice, "converter").conditions.mirrorDegeneration).toBe(1000);
    expect(stage(voice, "mirror").conditions.referenceCurrent).toBe(result(voice, "converter", "outputCurrent"));
    expect(stage(voice, "mirror").conditions.outputVoltage).toBeCloseTo(-10.7, 9);
    expect(stage(voice, "cell").conditions.biasCurrent).toBe(result(voice, "mirror", "outputCurrent"));
  });

  test("an unbuffered envelope decays into the cell that it feeds, whose load depends on the envelope", () => {
    const load = result(voice, "switch", "envelopeLoad");
    expect(stage(voice, "snap").conditions.loadResistance).toBeCloseTo(load, 6);
    const alone = computeChain(withStage(twoPaths(), "snap", { apart: true }), find);
    expect(stage(alone, "snap").conditions.loadResistance).toBe(null);
    expect(result(voice, "snap", "decayTime60")).toBeLessThan(0.7 * result(alone, "snap", "decayTime60"));
  });

  test("a band-pass sees the pot in front of it", () => {
    const seen = stage(voice, "band").conditions.sourceResistance as number;
    expect(seen).toBe(result(voice, "amount", "wiperResistance"));
    expect(seen).toBeGreaterThan(10e3);
    const alone = computeChain(withStage(twoPaths(), "band", { apart: true }), find);
    expect(result(voice, "band", "peakGain")).toBeLessThan(0.7 * result(alone, "band", "peakGain"));
  });

  test("conditions of the voice hold for every stage that takes them, but not for one set apart", () => {
    const chain = {
      ...withStage(twoPaths(), "cell", { apart: true }),
      conditions: { temperature: 310, railPositive: 15 },
    };
    const computed = computeChain(chain, find);
    expect(stage(computed, "switch").conditions.temperature).toBe(310);
    expect(stage(computed, "driver").conditions.railPositive).toBe(15);
    expect(stage(computed, "cell").conditions.temperature).toBe(298.15);
  });

  test("a stage whose network this version does not know is left out, and the rest is computed", () => {
    const odd = { ...stageOf("odd", "band-pass", "passive"), kind: "unheard-of" };
    const computed = computeChain({ ...twoPaths(), stages: [...twoPaths().stages, odd] }, find);
    expect(computed.stages.has("odd")).toBe(false);
    expect(computed.stages.size).toBe(twoPaths().stages.length);
  });
});

describe("a change computes what depends on it, and only that", () => {
  const chain = twoPaths();
  const whole = computeChain(chain, find);

  test.each([
    ["driver", "rf", 33e3, ["driver"]],
    ["converter", "re", 22e3, ["converter", "mirror", "cell", "sum", "driver"]],
    ["sum", "rf", 33e3, ["sum", "driver"]],
    ["amount", "rPot", 20e3, ["amount", "band", "cell", "switch", "snap", "sum", "driver"]],
  ])("%s.%s", (id, part, value, touched) => {
    const next = computeChain(withPart(chain, id, part, value), find, whole);
    const anew = [...next.stages.keys()].filter(
      (key) => next.stages.get(key)!.analysis !== whole.stages.get(key)!.analysis,
    );
    expect(anew.sort()).toEqual([...touched].sort());
  });

  test("no change computes nothing", () => {
    expect(computeChain({ ...chain }, find, whole).analysed).toBe(0);
  });

  test("step by step comes to the same as all at once, whatever is changed", () => {
    const change = fc.record({
      at: fc.constantFrom(0, 1, 2, 4, 5, 6, 7, 8, 9, 10, 11),
      factor: fc.double({ min: 0.5, max: 2, noNaN: true }),
      cut: fc.option(fc.nat(12)),
    });
    fc.assert(
      fc.property(fc.array(change, { minLength: 1, maxLength: 4 }), (changes) => {
        let now = chain;
        let computed = whole;
        for (const { at, factor, cut } of changes) {
          const picked = now.stages[at]!;
          const [part, value] = Object.entries(picked.parts).find(([, size]) => size > 0)!;
          now = withPart(now, picked.id, part, value * factor);
          if (cut !== null) now = { ...now, links: now.links.filter(({ id }) => id !== `l${cut}`) };
          computed = computeChain(now, find, computed);
        }
        const fresh = computeChain(now, find);
        for (const [id, { analysis }] of fresh.stages) {
          for (const [key, value] of Object.entries(analysis.results)) {
            if (typeof value !== "number") continue;
            const other = computed.stages.get(id)!.analysis.results[key] as number;
            expect(Math.abs(other - value), `${id}.${key}`).toBeLessThanOrEqual(1e-7 * Math.abs(value) + 1e-15);
          }
        }
      }),
      { numRuns: 25 },
    );
  });
});

describe("waves", () => {
  const levels = (stages: Chain["stages"], ...links: string[]) => {
    const computed = computeChain({ stages, links: linksOf(...links), conditions: {} }, find);
    return (id: string) => computed.stages.get(id)!.gives.out as AudioSignal;
  };
  const even = { parts: { r1: 22e3, r2: 22e3, rf: 22e3 } };
  const sum = stageOf("sum", "summing-node", "inverting", even);

  test("of two sources add by squares", () => {
    const of = levels(
      [stageOf("a", "test-noise", "white"), stageOf("b", "test-noise", "white"), sum],
      "a.out > sum.in1",
      "b.out > sum.in2",
    );
    expect(of("sum").rms).toBeCloseTo(Math.SQRT2, 12);
  });

  test("of one source add in full where the inversions agree, and cancel where they do not", () => {
    const once = stageOf("once", "output-driver", "inverting", { parts: { ri: 10e3, rf: 10e3, ro: 0 } });
    const source = stageOf("a", "test-noise", "white");
    const alike = levels([source, sum], "a.out > sum.in1", "a.out > sum.in2");
    expect(alike("sum").rms).toBeCloseTo(2, 12);
    const against = levels([source, once, sum], "a.out > once.in", "a.out > sum.in1", "once.out > sum.in2");
    expect(against("sum").rms).toBeCloseTo(0, 9);
  });

  test("the sum's own figure agrees with the wave it passes on", () => {
    const chain = twoPaths();
    const computed = computeChain(chain, find);
    const out = computed.stages.get("sum")!.gives.out as AudioSignal;
    expect(out.rms).toBeCloseTo(result(computed, "sum", "outputRms"), 9);
  });

  test("a filter makes a wave of its own, and a limited path goes with it only in part", () => {
    const computed = computeChain(twoPaths(), find);
    const [cell, limited] = ["cell", "switch"].map((id) => computed.stages.get(id)!.gives.out as AudioSignal);
    expect(Object.keys(cell!.mix)).toEqual(["band"]);
    expect(Math.abs(limited!.mix.band!) / limited!.rms).toBeCloseTo(result(computed, "switch", "correlation"), 9);
  });
});
