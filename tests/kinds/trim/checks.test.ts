import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  analyseStage,
  defaultParts,
  designExactly,
  isRefusal,
  plotStage,
  type PlainConditions,
  type PlainValues,
} from "#lib/circuit/index.ts";
import { trim } from "#lib/circuit/kinds/trim/index.ts";
import { logarithmicBase, potFraction, potSlope } from "#lib/circuit/parts/potLaw.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { nodalTransfer, type Element } from "../../support/nodal.ts";
import { worked, workedKeys } from "../../support/published.ts";
import { logarithmic, runs } from "../../support/random.ts";

const topologyOf = (id: string) => trim.topologies.find((one) => one.id === id)!;
const figures = (id: string, parts: PlainValues, conditions: PlainConditions = {}, targets: PlainValues = {}) => {
  const topology = topologyOf(id);
  const request = { parts: { ...defaultParts(topology), ...parts }, conditions, targets };
  return analyseStage(topology, request).results as Record<string, number>;
};

const volts = 7.8;
const window = { least: volts / 700e-6, most: volts / 300e-6 };
const rheostat = (rFixed: number, rPot: number, more: PlainConditions = {}) =>
  figures("rheostat", { rFixed, rPot }, { controlVoltage: volts, ...more }, window);
const original = rheostat(4.7e3, 100e3);
const revalued = rheostat(8.2e3, 25e3);
const ends = { endResistance: 0.01 };
const divider = (parts: PlainValues = {}, conditions: PlainConditions = {}) =>
  figures("divider", { rTop: 390e3, rPot: 10e3, rBottom: 12e3, ...parts }, conditions, { least: 0.35, most: 0.65 });
/** A bare pot from 1 V: the value is the law, bent by a load of the pot over `ratio`. */
const bare = (rotation: number, ratio?: number, more: PlainConditions = {}) =>
  figures(
    "divider",
    { rTop: 0, rPot: 50e3, rBottom: 0 },
    { referenceVoltage: 1, rotation, ...(ratio && { loadResistance: 50e3 / ratio }), ...more },
  );
const logarithmicPot = { potLaw: "logarithmic" };
const segments = { ...logarithmicPot, lawShape: "two-segment" };

const got: Record<string, () => number> = {
  "trim.Vpk": () => volts,
  "trim.I_lo_uA": () => 300,
  "trim.I_hi_uA": () => 700,
  "trim.R_need_lo_k": () => window.least / 1e3,
  "trim.R_need_hi_k": () => window.most / 1e3,
  "trim.orig_a0": () => (window.least - original.endLow!) / (original.endHigh! - original.endLow!),
  "trim.orig_a1": () => (window.most - original.endLow!) / (original.endHigh! - original.endLow!),
  "trim.orig_use_pct": () => original.usefulRotation! * 100,
  "trim.orig_use_deg": () => original.usefulDegrees!,
  "trim.orig_I_lo_uA": () => original.leastCurrent! * 1e6,
  "trim.orig_I_hi_uA": () => original.mostCurrent! * 1e6,
  "trim.new_a0": () => (window.least - revalued.endLow!) / (revalued.endHigh! - revalued.endLow!),
  "trim.new_a1": () => (window.most - revalued.endLow!) / (revalued.endHigh! - revalued.endLow!),
  "trim.new_use_pct": () => revalued.usefulRotation! * 100,
  "trim.new_use_deg": () => revalued.usefulDegrees!,
  "trim.new_I_lo_uA": () => revalued.leastCurrent! * 1e6,
  "trim.new_I_hi_uA": () => revalued.mostCurrent! * 1e6,
  "trim.new_span_dB": () => revalued.spanDb!,
  "trim.wc_Rmax_k": () => rheostat(8.2e3, 25e3, ends).worstHigh! / 1e3,
  "trim.wc_Rmin_k": () => rheostat(8.2e3, 25e3, ends).worstLow! / 1e3,
  "trim.wc_ok": () => (rheostat(8.2e3, 25e3, ends).worstCaseMargin! >= 0 ? 1 : 0),
  "trim.margin_pct": () => rheostat(8.2e3, 25e3, ends).worstCaseMargin! * 100,
  "trim.p20k_Rmax_k": () => rheostat(8.2e3, 20e3).worstHigh! / 1e3,
  "trim.p20k_margin_pct": () => rheostat(8.2e3, 20e3).worstCaseMargin! * 100,
  "trim.R_500_k": () => (8.2e3 + revalued.centre! * 25e3) / 1e3,
  "trim.dIdth_orig": () => original.sensitivityPerDegree! * 100,
  "trim.dIdth_new": () => revalued.sensitivityPerDegree! * 100,
  "trim.orig_deg_at_500": () => original.centreDegrees!,
  "trim.new_deg_at_500": () => revalued.centreDegrees!,
  "trim.div_lo_V": () => divider().endLow!,
  "trim.div_hi_V": () => divider().endHigh!,
  "trim.div_mV_per_deg": () => divider().slopePerDegree! * 1e3,
  "trim.div_wc_lo_V": () => divider().worstLow!,
  "trim.div_wc_hi_V": () => divider().worstHigh!,
  "trim.noPad_use_pct": () => divider({ rTop: 0, rBottom: 0 }).usefulRotation! * 100,
  "trim.b_10": () => logarithmicBase(0.1),
  "trim.b_15": () => logarithmicBase(0.15),
  "trim.b_20": () => logarithmicBase(0.2),
  "trim.y25_15": () => bare(0.25, undefined, logarithmicPot).value! * 100,
  "trim.y75_15": () => bare(0.75, undefined, logarithmicPot).value! * 100,
  "trim.rev50_15": () => bare(0.5, undefined, { potLaw: "reverse-logarithmic" }).value! * 100,
  "trim.seg25_15": () => bare(0.25, undefined, segments).value! * 100,
  "trim.seg75_15": () => bare(0.75, undefined, segments).value! * 100,
  "trim.dB50_15": () => 20 * Math.log10(bare(0.5, undefined, logarithmicPot).value!),
  "trim.dB50_lin": () => 20 * Math.log10(bare(0.5).value!),
  // The ratio that bends a linear pot to 15 % at mid-travel, back from what is got there.
  "trim.load_ratio": () => (0.5 / bare(0.5, worked("trim.load_ratio")).value! - 1) * 4,
  "trim.load_y25": () => bare(0.25, 28 / 3).value! * 100,
  "trim.load_y75": () => bare(0.75, 28 / 3).value! * 100,
  "trim.wiper_Zmax_k": () => bare(0.5).wiperResistanceMost! / 1e3,
  "trim.load_err_10k_on_100k_pct": () => (bare(0.5, 0.1).value! / bare(0.5).value! - 1) * 100,
};
/** Exact padding, which the conformance suite also meets as a reference case. */
const pads = { "trim.div_Rb_k": "rBottom", "trim.div_Rt_k": "rTop" } as const;

describe("worked values of the trim", () => {
  it("are all checked here", () =>
    expect([...Object.keys(got), ...Object.keys(pads)].sort()).toEqual(workedKeys("trim.").sort()));
  it.each(Object.keys(got))("%s", (key) => expectPrinted(got[key]!(), worked(key), key));
  it.each(Object.entries(pads))("%s", (key, part) => {
    const parts = designExactly(topologyOf("divider"), { least: 0.35, most: 0.65 }, {}, { rPot: 10e3 });
    if (isRefusal(parts)) return expect.fail(parts.message);
    expectPrinted(parts[part]! / 1e3, worked(key), key);
  });
});

describe("the laws of a pot", () => {
  it("rise from 0 through their mid-travel share to 1, and their slope is their derivative", () => {
    const laws = fc.constantFrom("linear", "logarithmic", "reverse-logarithmic");
    const shapes = fc.constantFrom("curve", "two-segment");
    const midFractions = fc.double({ min: 0.05, max: 0.3, noNaN: true });
    fc.assert(
      fc.property(laws, shapes, midFractions, fc.integer({ min: 1, max: 98 }), (law, shape, m, k) => {
        const at = (x: number) => potFraction(law as never, x, m, shape as never);
        expect([at(0), at(1)]).toEqual([expect.closeTo(0, 12), expect.closeTo(1, 12)]);
        const middle = law === "linear" ? 0.5 : law === "logarithmic" ? m : 1 - m;
        expect(at(0.5)).toBeCloseTo(middle, 12);
        const x = (k + 0.5) / 100;
        const slope = (at(x + 1e-5) - at(x - 1e-5)) / 2e-5;
        expectRelative(potSlope(law as never, x, m, shape as never), slope, 1e-6, `${law} ${shape}`);
        expect(slope).toBeGreaterThan(0);
      }),
      runs(200),
    );
  });
});

describe("knobs", () => {
  const ohms = logarithmic(100, 1e6);

  it("set the voltage that nodal analysis finds, loaded or not", () => {
    fc.assert(
      fc.property(ohms, ohms, ohms, ohms, fc.integer({ min: 1, max: 99 }), (rTop, rPot, rBottom, load, k) => {
        const rotation = k / 100;
        const elements: Element[] = [
          { kind: "resistor", nodes: ["ref", "h"], value: rTop },
          { kind: "resistor", nodes: ["h", "w"], value: rPot * (1 - rotation) },
          { kind: "resistor", nodes: ["w", "l"], value: rPot * rotation },
          { kind: "resistor", nodes: ["l", "0"], value: rBottom },
          { kind: "resistor", nodes: ["w", "0"], value: load },
        ];
        const conditions = { rotation, loadResistance: load, referenceVoltage: 12 };
        const { value } = figures("divider", { rTop, rPot, rBottom }, conditions);
        expectRelative(value, 12 * nodalTransfer(elements, "ref", "w")(0).re, 1e-9, "wiper");
      }),
      runs(100),
    );
  });

  it("bracket every unit between the extremes and promise no more than the worst", () => {
    const deviation = fc.double({ min: -1, max: 1, noNaN: true });
    fc.assert(
      fc.property(ohms, ohms, ohms, deviation, deviation, deviation, (rTop, rPot, rBottom, p, l, h) => {
        const all = figures("divider", { rTop, rPot, rBottom });
        const unit = figures("divider", {
          rTop: rTop * (1 + 0.01 * h),
          rPot: rPot * (1 + 0.2 * p),
          rBottom: rBottom * (1 + 0.01 * l),
        });
        const hair = 1 + 1e-12;
        expect(unit.endLow!).toBeLessThanOrEqual(all.worstLow! * hair);
        expect(unit.endHigh! * hair).toBeGreaterThanOrEqual(all.worstHigh!);
        expect(unit.endLow! * hair).toBeGreaterThanOrEqual(all.extremeLow!);
        expect(unit.endHigh!).toBeLessThanOrEqual(all.extremeHigh! * hair);
      }),
      runs(100),
    );
  });

  it("find the window's rotation again on the drawn curve", () => {
    const laws = fc.constantFrom("linear", "logarithmic", "reverse-logarithmic");
    fc.assert(
      fc.property(logarithmic(1e3, 50e3), logarithmic(1e3, 200e3), laws, (rFixed, rPot, potLaw) => {
        const topology = topologyOf("rheostat");
        const parts = { rFixed, rPot };
        const targets = { least: rFixed + 0.2 * rPot, most: rFixed + 0.7 * rPot };
        const { centre } = figures("rheostat", parts, { potLaw }, targets);
        const [line] = plotStage(topology, { parts, conditions: { potLaw }, curves: ["travel"], at: [centre!] });
        expectRelative(line!.points[0]![1], (targets.least + targets.most) / 2, 1e-9, "centre");
      }),
      runs(100),
    );
  });
});
