import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { triggerInput } from "#lib/circuit/kinds/trigger-input/index.ts";
import { buttonLatency, edgeShare, slowestEdge, velocityFigures } from "#lib/circuit/kinds/trigger-input/model.ts";
import { heldWidth, thresholdAt } from "#lib/circuit/kinds/trigger-input/topologies/transistor-threshold/model.ts";
import type { PlainConditions } from "#lib/circuit/index.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { worked } from "../../support/published.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";

const [transistor, comparator] = triggerInput.topologies as [
  (typeof triggerInput.topologies)[0],
  (typeof triggerInput.topologies)[0],
];
const parts = { ra: 100e3, rb: 47e3, rc: 10e3, cd: 22e-9, rd: 47e3, rs: 1e3 };
const results = (conditions: PlainConditions = { beta: 100 }) =>
  analyseChange(transistor, { parts, conditions }).results as Record<string, number>;
const compared = () =>
  analyseChange(comparator, { parts: { rin: 100e3, rh: 1e6, rr1: 100e3, rr2: 20e3 } }).results as Record<
    string,
    number
  >;
/** The brief's velocity set takes its own trigger's width to half current for the pulse. */
const velocity = velocityFigures(
  { velocity: 5, velocityGain: 1.9, velocityDrop: 0.65, chargeTimeConstant: 470e-6 },
  1.0038013e-3,
) as Record<string, number>;

const table: [key: string, got: () => number, factor?: number][] = [
  ["trig.Vth_edge", () => results()["threshold"]!],
  ["trig.dVth_dT_mV", () => results()["thresholdDrift"]!, 1e3],
  ["trig.Zin_off", () => results()["inputResistance"]!],
  ["trig.Vth_half", () => results()["thresholdHalf"]!],
  ["trig.Vth_sat", () => results()["thresholdSaturated"]!],
  ["trig.tw_unloaded_ms", () => results()["pulseWidthUnloaded"]!, 1e3],
  ["trig.tw_ode_ms", () => results()["pulseWidthHalf"]!, 1e3],
  ["trig.peakfrac_slow", () => edgeShare(1e-3, 48e3 * 22e-9)],
  ["cmp.VTp", () => compared()["threshold"]!],
  ["cmp.VTn", () => compared()["fallingThreshold"]!],
  ["cmp.hyst", () => compared()["hysteresis"]!],
  ["cmp.Vref", () => compared()["reference"]!],
  ["pb.delay_ms", () => results({ beta: 100, buttonTimeConstant: 10e-3 })["buttonLatency"]!, 1e3],
  ["vel.Vpk_5V", () => velocity["velocityPeak"]!],
  ["vel.Vpk_3V", () => velocity["velocityPeakMiddle"]!],
  ["vel.Vpk_1V", () => velocity["velocityPeakLow"]!],
  ["vel.ratio_dB", () => velocity["velocityRangeDb"]!],
  ["vel.dead_V", () => velocity["velocityDeadZone"]!],
];

describe("the worked sets of the trigger input", () => {
  it.each(table)("reproduces %s", (key, got, factor = 1) => {
    expectPrinted(got() * factor, worked(key), key, key === "vel.ratio_dB" ? 7 : key === "trig.tw_ode_ms" ? 7 : 8);
  });

  it("differs from the worked loaded width by what the held base feeds back at first", () => {
    // The worked width starts from Vs·Re/(Re + Rs) and leaves out what the base adds there through RA.
    const re = 1 / (1 / parts.rd + 1 / parts.ra);
    const settles = (0.6 * parts.rd) / (parts.rd + parts.ra);
    const tau = (re + parts.rs) * parts.cd;
    const threshold = results()["threshold"]!;
    const printed = tau * Math.log(((10 * re) / (re + parts.rs) - settles) / (threshold - settles));
    expectPrinted(printed * 1e3, worked("trig.tw_loaded_ms"), "trig.tw_loaded_ms");
    expectRelative(results()["pulseWidth"], printed, 4e-4, "pulse width");
    expect(results()["pulseWidth"]).toBeGreaterThan(printed);
  });
});

interface Given {
  ra: number;
  rb: number;
  rc: number;
  cd: number;
  rd: number;
  rs: number;
  step: number;
  rail: number;
  beta: number;
  is: number;
}

describe("the transistor threshold against scipy's stiff integrator", () => {
  const { cases } = committed<Given, { widthHalf: number; width: number }>("trigger_input");
  it.each(cases.map((one) => [one.given.id, one] as const))("has the widths of %s", (_, { given, figures }) => {
    const { step, rail, beta, is, ra, rb, rc, cd, rd, rs } = given;
    const got = analyseChange(transistor, {
      parts: { ra, rb, rc, cd, rd, rs },
      conditions: { pulseHeight: step, railPositive: rail, beta, saturationCurrent: is },
    }).results;
    expectRelative(got["pulseWidthHalf"], figures.widthHalf, 1e-8, "width to half the collector current");
    expectRelative(got["pulseWidth"], figures.width, 1e-8, "width to the edge of conduction");
  });
  itGivesTheCommittedFiguresAgain("trigger_input", 1e-8);
});

describe("the trigger input", () => {
  it("finds the edge that just passes the share asked for", () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 0.999999, noNaN: true }), logarithmic(1e-6, 1), (share, tau) =>
        expectRelative(edgeShare(slowestEdge(share, tau)!, tau), share, 1e-9, "share"),
      ),
      runs(300),
    );
  });

  it("fires at the slowest edge, and not a little beyond", () => {
    const { slowestEdge: slowest, threshold } = results();
    expectRelative(results({ beta: 100, riseTime: slowest! })["edgePeak"], threshold!, 1e-10, "peak");
  });

  it("holds longer with a higher pulse, a larger capacitor or resistor, and a lower threshold", () => {
    fc.assert(
      fc.property(partsOf(transistor), fc.integer({ min: 30, max: 120 }), (random, tenths) => {
        const network = random as typeof parts;
        const threshold = thresholdAt(network, 0.6, 0);
        const width = heldWidth(network, tenths / 10, 0.6, threshold);
        fc.pre(width !== undefined);
        expect(heldWidth(network, tenths / 10 + 0.1, 0.6, threshold)).toBeGreaterThan(width!);
        expectRelative(
          heldWidth({ ...network, cd: network.cd * 2 }, tenths / 10, 0.6, threshold),
          2 * width!,
          1e-12,
          "C",
        );
        expect(heldWidth({ ...network, rd: network.rd * 1.1 }, tenths / 10, 0.6, threshold)).toBeGreaterThan(width!);
      }),
      runs(200),
    );
  });

  it("keeps the comparator's falling threshold below its rising one by the hysteresis", () => {
    fc.assert(
      fc.property(partsOf(comparator), conditionsOf(comparator), (random, conditions) => {
        const got = analyseChange(comparator, { parts: random, conditions }).results as Record<string, number>;
        const swing = (conditions["outputHigh"] as number) - (conditions["outputLow"] as number);
        expectRelative(got["hysteresis"], (swing * random["rin"]!) / random["rh"]!, 1e-9, "hysteresis");
      }),
      runs(100),
    );
  });

  it("delays a button by no time where the threshold vanishes, and never fires where the rail is below it", () => {
    expect(buttonLatency(10e-3, 12, 1e-9)).toBeLessThan(1e-11);
    expect(buttonLatency(10e-3, 12, 12)).toBeUndefined();
  });
});
