import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { transistorCell } from "#lib/circuit/kinds/transistor-cell/index.ts";
import { averageOf, switchedRms, type Cell } from "#lib/circuit/kinds/transistor-cell/model.ts";
import { shareAbove } from "#lib/circuit/numeric/gaussianTail.ts";
import { thermalVoltage } from "#lib/circuit/device/constants.ts";
import type { PlainConditions, PlainValues } from "#lib/circuit/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { worked } from "../../support/published.ts";
import { logarithmic, runs } from "../../support/random.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";

const topology = transistorCell.topologies[0]!;
/** The worked set has no output resistor. */
const parts = { ri: 10e3, rb: 100e3, rc: 10e3, ro: 1e12 };
const results = (conditions: PlainConditions = {}, change: PlainValues = {}) =>
  analyseChange(topology, { parts: { ...parts, ...change }, conditions }).results as Record<string, number>;
const at = (controlVoltage: number, sourceRms = 1) => results({ controlVoltage, sourceRms });

/**
 * The worked averages were taken on a grid of drives: they agree with the exact ones to a few parts in 10⁵, the share of
 * the time on, counted on that grid, to a few in 10³.
 */
const [averaged, counted] = [1.2e-4, 3e-3];

const table: [key: string, tolerance: number, got: () => number][] = [
  ["sw.rms_0p0", averaged, () => at(8)["bleedRms"]!],
  ["sw.rms_0p25", averaged, () => at(0.25)["outputRms"]!],
  ["sw.rms_0p5", averaged, () => at(0.5)["outputRms"]!],
  ["sw.rms_1p0", averaged, () => at(1)["outputRms"]!],
  ["sw.rms_2p0", averaged, () => at(2)["outputRms"]!],
  ["sw.rms_4p0", averaged, () => at(4)["outputRms"]!],
  ["sw.rms_8p0", averaged, () => at(8)["outputRms"]!],
  ["sw.mean_1p0", averaged, () => at(1)["thump"]!],
  ["sw.thump_V", averaged, () => at(8)["thump"]!],
  ["sw.vcap", 2e-4, () => at(8)["selfBias"]!],
  ["sw.Von", 1e-12, () => at(8)["onVoltage"]!],
  ["sw.duty_pred", 2e-4, () => at(8)["dutyLaw"]!],
  ["sw.duty", counted, () => at(8)["duty"]!],
  ["sw.law_8p0", counted, () => at(8)["outputLaw"]!],
  ["sw.law_1p0", counted, () => switchedRms(1, at(8)["duty"]!)],
  ["sw.rho_8", averaged, () => at(8)["correlation"]!],
  ["sw.rms8_sig0p5", averaged, () => at(8, 0.5)["outputRms"]!],
  ["sw.rms8_sig2p0", averaged, () => at(8, 2)["outputRms"]!],
  ["sw.range_8to1_dB", averaged, () => 20 * Math.log10(at(8)["outputRms"]! / at(1)["outputRms"]!)],
  ["sw.bleed_dB", averaged, () => at(8)["bleedDb"]!],
  // The worked load is the approximation Rc/d.
  ["sw.Rload_k", counted, () => 10 / at(8)["duty"]!],
];

describe("the worked set of the transistor cell", () => {
  it.each(table)("agrees with %s", (key, tolerance, got) => expectRelative(got(), worked(key), tolerance, key));

  it("loads the envelope by its mean current, within two per cent of collector resistor over share of time", () => {
    const { envelopeLoad, thump } = at(8);
    expectRelative(envelopeLoad, 8 / ((8 - thump!) / 10e3), 1e-12, "load");
    expectRelative(envelopeLoad, worked("sw.Rload_k") * 1e3, 0.02, "load");
  });
});

interface Given {
  ri: number;
  rb: number;
  rc: number;
  ro: number;
  supply: number;
  sigma: number;
  beta: number;
  reverse: number;
  is: number;
  kelvin: number;
}
type Figures = Record<"outputRms" | "thump" | "selfBias" | "correlation" | "duty", number>;

describe("the transistor cell against scipy", () => {
  const { cases } = committed<Given, Figures>("transistor_cell");
  it.each(cases.map((one) => [one.given.id, one] as const))("averages as %s does", (_, { given, figures }) => {
    const got = results(
      {
        controlVoltage: given.supply,
        sourceRms: given.sigma,
        beta: given.beta,
        reverseBeta: given.reverse,
        saturationCurrent: given.is,
        temperature: given.kelvin,
      },
      { ri: given.ri, rb: given.rb, rc: given.rc, ro: given.ro },
    );
    for (const key of ["outputRms", "thump", "selfBias", "correlation"] as const)
      expectRelative(got[key], figures[key], 2e-6, key);
    expect(Math.abs(got["duty"]! - figures.duty)).toBeLessThan(2e-5);
  });
  itGivesTheCommittedFiguresAgain("transistor_cell", 1e-6);
});

const cell = fc.record<Cell>({
  base: logarithmic(1e3, 100e3),
  toGround: logarithmic(10e3, 1e6),
  collector: logarithmic(2.2e3, 47e3),
  supply: fc.integer({ min: 5, max: 100 }).map((x) => x / 10),
  beta: logarithmic(50, 600),
  reverseBeta: logarithmic(1, 10),
  saturationCurrent: logarithmic(1e-16, 1e-12),
  thermalVoltage: fc.constant(thermalVoltage(298.15)),
});
const sigma = logarithmic(0.1, 3);

describe("averages under Gaussian drive", () => {
  it("stay within what a switch to the envelope allows", () => {
    fc.assert(
      fc.property(cell, sigma, (one, drive) => {
        const { mean, rms, correlation, duty, selfBias } = averageOf(one, drive);
        expect(mean).toBeGreaterThan(0);
        expect(mean).toBeLessThanOrEqual(one.supply * (1 + 1e-9));
        // No variable between 0 and V strays more than √(m(V − m)) about its mean m.
        expect(rms).toBeLessThanOrEqual(Math.sqrt(Math.max(0, mean * (one.supply - mean))) + 0.01 * one.supply);
        expect(correlation).toBeLessThanOrEqual(1);
        expect(duty).toBeLessThan(0.5);
        expect(selfBias).toBeGreaterThanOrEqual(0);
      }),
      runs(80),
    );
  });

  it("do not change with the scale of all impedances", () => {
    fc.assert(
      fc.property(cell, sigma, (one, drive) => {
        const scaled = {
          ...one,
          base: one.base / 2,
          toGround: one.toGround / 2,
          collector: one.collector / 2,
          saturationCurrent: one.saturationCurrent * 2,
        };
        const [a, b] = [averageOf(one, drive), averageOf(scaled, drive)];
        for (const key of ["mean", "rms", "selfBias"] as const)
          expect(Math.abs(a[key] - b[key]), key).toBeLessThan(1e-7);
      }),
      runs(40),
    );
  });
});

describe("shareAbove", () => {
  it("gives the tabled probabilities", () => {
    // Two-sided 3 and 4 standard deviations of the trade brief.
    expectRelative(2 * shareAbove(3) * 100, worked("nz.exceed_3s_pct"), 1e-7, "3 σ");
    expectRelative(2 * shareAbove(4) * 1e6, worked("nz.exceed_4s_ppm"), 1e-7, "4 σ");
    expect(shareAbove(0)).toBeCloseTo(0.5, 13);
    expectRelative(shareAbove(-1.7) + shareAbove(1.7), 1, 1e-13, "both sides");
  });
});
