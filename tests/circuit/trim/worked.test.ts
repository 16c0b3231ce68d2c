import { describe, expect, it } from "vitest";
import {
  runRevalue,
  trimCoverage,
  trimFigures,
  type Knob,
  type RevalueWish,
  type TrimRequest,
} from "#lib/circuit/analysis/trim/index.ts";
import { bandPass } from "#lib/circuit/kinds/band-pass/index.ts";
import { decayEnvelope } from "#lib/circuit/kinds/decay-envelope/index.ts";
import { trim } from "#lib/circuit/kinds/trim/index.ts";
import type { AnyTopology } from "#lib/circuit/index.ts";
import worked from "../../reference/worked.json" with { type: "json" };
import { expectPrinted, expectRelative } from "../../support/approx.ts";

const value = (key: keyof typeof worked) => worked[key].value;
const [rheostat, divider] = ["rheostat", "divider"].map((id) => trim.topologies.find((one) => one.id === id)!);
const multipleFeedback = bandPass.topologies.find(({ id }) => id === "multiple-feedback")!;
const plain: Knob = { law: "linear", shape: "curve", midFraction: 0.15, endResistance: 0, electricalAngle: 270 };

function toTheEnd<T>(steps: Generator<unknown, T>): T {
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}
const figures = (topology: AnyTopology, request: TrimRequest) => toTheEnd(trimFigures(topology, request));
const coverage = (topology: AnyTopology, request: TrimRequest) => toTheEnd(trimCoverage(topology, request));
const revalue = (topology: AnyTopology, request: TrimRequest, wish: RevalueWish) =>
  toTheEnd(runRevalue(topology, request, wish));

/** The trade brief, 2.15: 300 to 700 µA from 7.8 V, set by a rheostat. */
const current = (rFixed: number, rPot: number, more: Partial<TrimRequest> = {}): TrimRequest => ({
  parts: { rFixed, rPot },
  conditions: { controlVoltage: value("trim.Vpk") },
  tolerances: { rFixed: 0.01, rPot: 0.2 },
  boards: 500,
  seed: 1,
  distribution: "uniform",
  knob: plain,
  result: "current",
  window: { least: 300e-6, most: 700e-6 },
  ...more,
});

describe("the worked sets of the trade brief, 2.15", () => {
  const original = figures(rheostat!, current(4700, 100e3));
  const better = figures(rheostat!, current(8200, 25e3));

  it("the original trim uses 40° of its travel", () => {
    expectPrinted(100 * original.usefulRotation, value("trim.orig_use_pct"), "per cent");
    expectPrinted(original.usefulDegrees, value("trim.orig_use_deg"), "degrees");
    const [zero, full] = original.ends;
    expectPrinted(zero!.value * 1e6, value("trim.orig_I_hi_uA"), "current at 0°");
    expectPrinted(full!.value * 1e6, value("trim.orig_I_lo_uA"), "current at the far end");
    expect(zero!.warnings.map(({ code, severity }) => [code, severity])).toContainEqual(["end-unsafe", "fault"]);
    expectPrinted(original.centre! * 270, value("trim.orig_deg_at_500"), "degrees at 500 µA");
    expectRelative(100 * original.sensitivityPerDegree!, value("trim.dIdth_orig"), 1e-6, "per cent per degree");
  });

  it("the re-valued one uses 160°, with safe ends and a margin at worst case", () => {
    expectPrinted(100 * better.usefulRotation, value("trim.new_use_pct"), "per cent");
    expectPrinted(better.usefulDegrees, value("trim.new_use_deg"), "degrees");
    expectPrinted(better.ends[0]!.value * 1e6, value("trim.new_I_hi_uA"), "current at 0°");
    expectPrinted(better.ends[1]!.value * 1e6, value("trim.new_I_lo_uA"), "current at the far end");
    expectPrinted(better.centre! * 270, value("trim.new_deg_at_500"), "degrees at 500 µA");
    expectRelative(100 * better.sensitivityPerDegree!, value("trim.dIdth_new"), 1e-6, "per cent per degree");
    expectPrinted(100 * better.worstCaseMargin, value("trim.margin_pct"), "margin");
    expectPrinted(value("trim.Vpk") / better.reach!.least / 1e3, value("trim.wc_Rmax_k"), "largest resistance of all");
    // The smallest was worked with a hundredth of the track left over at the pot's end.
    const { reach } = figures(rheostat!, current(8200, 25e3, { knob: { ...plain, endResistance: 0.01 } }));
    expectPrinted(value("trim.Vpk") / reach!.most / 1e3, value("trim.wc_Rmin_k"), "smallest resistance of all");
  });

  it("a 20k pot fails at worst case", () => {
    expectPrinted(
      100 * figures(rheostat!, current(8200, 20e3)).worstCaseMargin,
      value("trim.p20k_margin_pct"),
      "margin",
    );
  });

  it("re-value finds a choice at least as good, which every board covers", () => {
    const { choices, reached } = revalue(rheostat!, current(4700, 100e3), { useful: 0.5 });
    expect(reached).toBe(true);
    const best = choices[0]!;
    expect(best.usefulRotation).toBeGreaterThanOrEqual(value("trim.new_use_pct") / 100);
    const again = figures(rheostat!, current(4700, 100e3, { parts: { rFixed: 4700, rPot: 100e3, ...best.parts } }));
    expectRelative(again.usefulRotation, best.usefulRotation, 1e-5, "useful");
    expect(again.worstCaseMargin).toBeGreaterThanOrEqual(0);
    expect(again.ends.flatMap(({ warnings }) => warnings).filter(({ severity }) => severity === "fault")).toEqual([]);
    const boards = coverage(rheostat!, current(1, 1, { parts: { rFixed: 4700, rPot: 100e3, ...best.parts } }));
    expect(boards.ofWindow.value).toBe(1);
  });

  it("the padded divider: its ends, slope and worst case, and what it is without pads", () => {
    const request = (rTop: number, rBottom: number): TrimRequest => ({
      ...current(1, 1),
      parts: { rTop, rPot: 10e3, rBottom },
      conditions: {},
      tolerances: { rTop: 0.01, rPot: 0.2, rBottom: 0.01 },
      result: "value",
      window: { least: 0.35, most: 0.65 },
    });
    const padded = figures(divider!, request(390e3, 12e3));
    expectPrinted(padded.ends[0]!.value, value("trim.div_lo_V"), "low end");
    expectPrinted(padded.ends[1]!.value, value("trim.div_hi_V"), "high end");
    expectPrinted(1e3 * padded.slopePerDegree!, value("trim.div_mV_per_deg"), "mV per degree", 7);
    expectPrinted(padded.reach!.least, value("trim.div_wc_lo_V"), "worst low end");
    expectPrinted(padded.reach!.most, value("trim.div_wc_hi_V"), "worst high end");
    expect(padded.worstCaseMargin).toBeLessThan(0);
    expectPrinted(100 * figures(divider!, request(0, 0)).usefulRotation, value("trim.noPad_use_pct"), "without pads");
    const { choices } = revalue(divider!, request(390e3, 12e3), { useful: 0.4 });
    expect(choices[0]!.worstCaseMargin).toBeGreaterThanOrEqual(0);
  });

  it("logarithmic laws and their two segments", () => {
    const shares = (knob: Partial<Knob>) => {
      // 0 to 100 Ω in series with nothing: the resistance is the share of the track.
      const { travel } = figures(rheostat!, {
        ...current(1, 1),
        parts: { rFixed: 1e-9, rPot: 100 },
        conditions: {},
        knob: { ...plain, ...knob },
        result: "value",
        window: { least: 1, most: 99 },
      });
      return (rotation: number) => solveOn(travel, rotation);
    };
    const smooth = shares({ law: "logarithmic" });
    expectRelative(smooth(0.5), 15, 1e-6, "at half");
    // A quarter lies between two of the drawn points.
    expectRelative(smooth(0.25), value("trim.y25_15"), 2e-3, "at a quarter");
    expectRelative(smooth(0.75), value("trim.y75_15"), 2e-3, "at three quarters");
    const printed = shares({ law: "logarithmic", shape: "two-segment" });
    expectRelative(printed(0.25), value("trim.seg25_15"), 1e-6, "segment at a quarter");
    expectRelative(printed(0.75), value("trim.seg75_15"), 1e-6, "segment at three quarters");
    expectRelative(shares({ law: "reverse-logarithmic" })(0.5), value("trim.rev50_15"), 1e-6, "reversed");
    expectRelative(shares({ endResistance: 0.02 })(0), 2, 1e-6, "left over at the end");
  });

  it("a loaded wiper bends the law", () => {
    const { travel } = figures(divider!, {
      ...current(1, 1),
      parts: { rTop: 0, rPot: 50e3, rBottom: 0 },
      conditions: { referenceVoltage: 100, loadResistance: 50e3 / value("trim.load_ratio") },
      tolerances: {},
      result: "value",
      window: { least: 1, most: 99 },
    });
    expectRelative(solveOn(travel, 0.25), value("trim.load_y25"), 2e-3, "a quarter");
    expectRelative(solveOn(travel, 0.75), value("trim.load_y75"), 2e-3, "three quarters");
    expectRelative(solveOn(travel, 0.5), 15, 1e-6, "half");
  });
});

/** Between the points of a travel. */
function solveOn(travel: readonly (readonly [number, number])[], rotation: number): number {
  const after = travel.findIndex(([x]) => x >= rotation - 1e-12);
  const [to, from] = [travel[after]!, travel[Math.max(0, after - 1)]!];
  if (to[0] === from[0]) return to[1];
  return from[1] + ((to[1] - from[1]) * (rotation - from[0])) / (to[0] - from[0]);
}

describe("any part marked as a pot, in any stage", () => {
  const filter = (target: number): TrimRequest => ({
    parts: { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 },
    tolerances: { ra: 0.01, rb: 0.01, rf: 0.01, rbPot: 0.2, c1: 0.05, c2: 0.05 },
    boards: 4000,
    seed: 7,
    distribution: "uniform",
    knob: plain,
    result: "centreFrequency",
    window: { least: value("mfb.bot_wc"), most: value("mfb.top_wc") },
    target,
  });

  it("the retune pot: what every board reaches, and coverage over random boards (trade brief 2.7, 3.2)", () => {
    const { reach, ends } = figures(multipleFeedback, filter(1000));
    expectPrinted(reach!.least, value("mfb.bot_wc"), "reached by all, low");
    expectPrinted(reach!.most, value("mfb.top_wc"), "reached by all, high");
    expectPrinted(ends[0]!.value, value("mfb.f0_hi"), "0°");
    expectPrinted(ends[1]!.value, value("mfb.f0_lo"), "270°");
    expect(coverage(multipleFeedback, filter(value("mfb.f0_mid"))).ofTarget.value).toBe(1);
    expect(coverage(multipleFeedback, filter(1000)).ofTarget.value).toBe(1);
    const high = coverage(multipleFeedback, filter(1100));
    const wanted = value("mc.retune_cover_1100_pct") / 100;
    expect(Math.abs(high.ofTarget.value - wanted)).toBeLessThan(4 * Math.sqrt((wanted * (1 - wanted)) / 4000));
    expect(high.rotations.reduce((sum, count) => sum + count, 0)).toBe(high.ofTarget.passed);
  });

  it("±3 semitones at constant bandwidth (trade brief 3.5), with values that exist", () => {
    const f0 = value("mfb.f0_mid");
    const window = { least: f0 * 2 ** (-3 / 12), most: f0 * 2 ** (3 / 12) };
    const request = { ...filter(f0), window };
    expect(figures(multipleFeedback, request).worstCaseMargin).toBeLessThan(0);
    const { choices } = revalue(multipleFeedback, request, { useful: 0 });
    const parts = { ...request.parts, ...choices[0]!.parts };
    expect(figures(multipleFeedback, { ...request, parts }).worstCaseMargin).toBeGreaterThanOrEqual(0);
    // Only what is in series with the pot was changed: the bandwidth stays.
    expect(Object.keys(choices[0]!.parts).every((part) => ["rb", "rbPot"].includes(part))).toBe(true);
  });

  it("a decay from 80 ms to 1.5 s on a stocked 500k pot (trade brief 3.5), or why it cannot be had", () => {
    const decay = decayEnvelope.topologies[0]!;
    const request: TrimRequest = {
      parts: { rs: 470, c: 470e-9, rMin: 10e3, rPot: 500e3 },
      tolerances: { rs: 0.01, c: 0.05, rMin: 0.01, rPot: 0.2 },
      boards: 200,
      seed: 1,
      distribution: "uniform",
      knob: plain,
      result: "decayTime60",
      window: { least: 80e-3, most: 1.5 },
    };
    const { choices, reached } = revalue(decay, request, { useful: 0, pots: [500e3] });
    if (reached) {
      const parts = { ...request.parts, ...choices[0]!.parts };
      expect(parts["rPot"]).toBe(500e3);
      expect(coverage(decay, { ...request, parts }).ofWindow.value).toBe(1);
    } else expect(choices).toEqual([]);
    // With the capacitor ten times smaller no 500k pot gets to 1.5 s.
    const hopeless = { ...request, parts: { ...request.parts, c: 47e-9 } };
    expect(revalue(decay, hopeless, { useful: 0, pots: [500e3] })).toMatchObject({ reached: false, choices: [] });
  });

  it("60 % of the travel: says which tolerance of the pot would make it possible", () => {
    const narrow = current(8200, 25e3);
    const wish = { useful: 0.7 };
    const answer = revalue(rheostat!, narrow, wish);
    if (!answer.reached) {
      expect(answer.wouldTake!.potTolerance).toBeLessThan(0.2);
      expect(answer.wouldTake!.choice.usefulRotation).toBeGreaterThanOrEqual(0.7);
    } else expect(answer.choices[0]!.usefulRotation).toBeGreaterThanOrEqual(0.7);
    const best = revalue(rheostat!, narrow, { useful: 0.99 });
    expect(best.reached).toBe(false);
  });
});
