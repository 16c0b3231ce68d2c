import { describe, expect, it } from "vitest";
import { spreadStage } from "#lib/circuit/analysis/spread/spread.ts";
import type { SpreadRequest } from "#lib/circuit/analysis/spread/request.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { binomialBounds, straightPassesFor } from "#lib/circuit/numeric/binomialBounds.ts";
import worked from "../../reference/worked.json" with { type: "json" };
import { expectPrinted, expectRelative } from "../../support/approx.ts";

const value = (key: keyof typeof worked) => worked[key].value;
const parts = { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 };
const centre = value("mfb.f0_mid");
const boards = 20_000;

/** The trade brief, 3.2: the filter of 2.7 with its pot at mid-travel, window ±5 % of its centre. */
const ask = (capacitor: number, more: Partial<SpreadRequest> = {}) =>
  spreadStage(multipleFeedback, {
    parts,
    tolerances: { ra: 0.01, rb: 0.01, rf: 0.01, rbPot: 0.2, c1: capacitor, c2: capacitor },
    window: { centreFrequency: { least: centre * 0.95, most: centre * 1.05 } },
    boards,
    seed: 7,
    distribution: "uniform",
    ...more,
  });

type Key = keyof typeof worked;
const sets: [string, ReturnType<typeof ask>, Key, Key | undefined][] = [
  ["5 % uniform", ask(0.05), "mc.sd_u5_pct", "mc.yield_u5_pct"],
  ["5 % as three sigma", ask(0.05, { distribution: "three-sigma" }), "mc.sd_g5_pct", "mc.yield_g5_pct"],
  ["5 % of one lot", ask(0.05, { lots: [["c1", "c2"]] }), "mc.sd_u5lot_pct", "mc.yield_u5lot_pct"],
  ["10 %", ask(0.1), "mc.sd_u10_pct", "mc.yield_u10_pct"],
  ["1 %", ask(0.01), "mc.sd_u1_pct", undefined],
];

describe("the worked sets of the trade brief, 3.2", () => {
  // Their boards and ours are different draws: a standard deviation is sure to 1/√(2n) of itself, a share to √(p(1 − p)/n).
  it.each(sets)("%s", (name, outcome, deviation, share) => {
    const spread = (outcome.results["centreFrequency"]!.standardDeviation / centre) * 100;
    expectRelative(spread, value(deviation), 4 / Math.sqrt(2 * boards), `${name} sd`);
    const wanted = share === undefined ? 1 : value(share) / 100;
    const sure = 4 * Math.sqrt((wanted * (1 - wanted)) / boards);
    expect(Math.abs(outcome.yield!.value - wanted), `${name}: ${outcome.yield!.value}`).toBeLessThanOrEqual(sure);
  });

  it("the root of the sum of squares", () => {
    expectPrinted(
      (ask(0.05, { boards: 10 }).rootSumSquare["centreFrequency"]!.standardDeviation / centre) * 100,
      value("mc.rss_u5_pct"),
      "rss",
    );
  });

  it("the worst case of 2.7", () => {
    const { least, most } = ask(0.05, { boards: 1 }).worstCase["centreFrequency"]!;
    expectRelative((least / centre - 1) * 100, value("mfb.wc_lo_pct"), 1e-7, "lowest");
    expectRelative((most / centre - 1) * 100, value("mfb.wc_hi_pct"), 1e-7, "highest");
  });

  it("the sensitivities of 2.7", () => {
    const sensitivities = ask(0.05, { boards: 1 }).sensitivities["centreFrequency"]!;
    for (const part of ["c1", "c2", "rf"]) expectRelative(sensitivities[part], -0.5, 1e-7, part);
    // That of the whole R_B, 3.2 kΩ, falls to its fixed part and its pot by their shares.
    const [fixed, pot] = [sensitivities["rb"]!, sensitivities["rbPot"]!];
    expectRelative(fixed + pot, value("mfb.Sf_RB"), 1e-7, "rb");
    expectRelative(fixed / pot, 2.2, 1e-6, "shares");
  });

  it("what straight passes prove", () => {
    expectPrinted(100 * binomialBounds(20, 20).low, value("mc.n20_ci_lo_pct"), "20 of 20");
    expect(straightPassesFor(0.95)).toBe(value("mc.n59"));
  });
});
