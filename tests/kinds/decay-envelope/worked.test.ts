import { describe, expect, it } from "vitest";
import { decayFactor, simplePeak } from "#lib/circuit/kinds/decay-envelope/model.ts";
import { decayEnvelope } from "#lib/circuit/kinds/decay-envelope/index.ts";
import { thermalVoltage } from "#lib/circuit/device/constants.ts";
import { expectPrinted } from "../../support/approx.ts";
import { analyseChange, codesOf } from "../../support/limitCase.ts";
import { worked } from "../../support/published.ts";

const topology = decayEnvelope.topologies[0]!;
const parts = { rs: 470, c: 1e-6, rMin: 10e3, rPot: 500e3 };
const results = (conditions: Record<string, number>, change: Partial<typeof parts> = {}) =>
  analyseChange(topology, { parts: { ...parts, ...change }, conditions }).results as Record<string, number>;

const load = { loadResistance: 1e6 };
const diode = { ...load, pulseHeight: 9.5, saturationCurrent: 4e-9, emissionCoefficient: 1.9 };
/** The brief's pulse is the one of its trigger stage, trig.tw_half_ms; its text does not say so. */
const pulseWidth = 1.0038013e-3;
const pulse = { ...diode, pulseWidth };

/** Key of the worked set, the figure here, and what turns it into the unit of the key. */
const table: [key: string, got: () => number, factor?: number][] = [
  ["const.VT_mV", () => thermalVoltage(298.15), 1e3],
  ["env.Reff_min", () => results({ ...load, rotation: 0 })["timeConstant"]! / parts.c],
  ["env.Reff_max", () => results({ ...load, rotation: 1 })["timeConstant"]! / parts.c],
  ["env.tau_min_ms", () => results({ ...load, rotation: 0 })["timeConstant"]!, 1e3],
  ["env.tau_max_ms", () => results({ ...load, rotation: 1 })["timeConstant"]!, 1e3],
  ["env.t20_min_ms", () => results({ ...load, rotation: 0 })["decayTime20"]!, 1e3],
  ["env.t60_min_ms", () => results(load)["shortestDecayTime60"]!, 1e3],
  ["env.t60_max_s", () => results(load)["longestDecayTime60"]!],
  ["env.t60_max_noload_s", () => results({})["longestDecayTime60"]!],
  ["env.t60_max_lo_s", () => results(load)["longestDecayTime60Low"]!],
  ["env.t60_max_hi_s", () => results(load)["longestDecayTime60High"]!],
  ["env.k20", () => decayFactor(20)],
  ["env.k60", () => decayFactor(60)],
  ["env.k9010", () => decayFactor(20 * Math.log10(9))],
  ["env.Vpk_ode_long", () => results({ ...pulse, rotation: 1 })["peakVoltage"]!],
  ["env.Vpk_ode_short", () => results({ ...pulse, rotation: 0 })["peakVoltage"]!],
  ["env.pot_level_dB", () => results(pulse)["knobLevelDb"]!],
  ["env.Ipk_mA", () => results(diode)["peakChargeCurrent"]!, 1e3],
  ["env.Ipk_100ohm_mA", () => results({ pulseHeight: 9.5, diodeDrop: 0.7 }, { rs: 100 })["peakChargeCurrent"]!, 1e3],
  ["env.Vpk_approx", () => results({ pulseHeight: 9.5, diodeDrop: 0.65, pulseWidth })["simplePeakVoltage"]!],
  ["vel.fill", () => simplePeak(1, 0, pulseWidth, 470e-6)],
  ["env.ped_bjt_mV", () => results({ ...load, rotation: 1, biasCurrent: 200e-9 })["pedestal"]!, 1e3],
  ["env.ped_jfet_uV", () => results({ ...load, rotation: 1, biasCurrent: 200e-12 })["pedestal"]!, 1e6],
  [
    "env.ped_dB_bjt",
    () => results({ ...load, rotation: 1, biasCurrent: 200e-9, pulseHeight: 7.8 }, { rs: 1e-3 })["pedestalDb"]!,
  ],
];

describe("the worked set of the decay envelope", () => {
  it.each(table)("reproduces %s", (key, got, factor = 1) => {
    expectPrinted(got() * factor, worked(key), key, key === "env.ped_dB_bjt" || key.startsWith("env.Vpk_ode") ? 7 : 8);
  });

  it("shortens the decay by the dead band as printed", () => {
    // 7.8 V and a dead band of 0.6 V, without a load that would lower the peak.
    const got = results({ pulseHeight: 7.8, deadBand: 0.6, rotation: 1 }, { rs: 1e-3 });
    const factor = (key: string) => got[key]! / got["timeConstant"]!;
    expectPrinted(factor("audibleDecayTime20"), worked("env.t20_dead_over_tau"), "t20", 7);
    expectPrinted(factor("audibleDecayTime60"), worked("env.t60_dead_over_tau"), "t60", 7);
    expectPrinted(factor("audibleEnd"), worked("env.tend_over_tau"), "end", 7);
  });

  it("warns of the 88 mA that 100 Ω would ask for, and of the pedestal of a bipolar buffer", () => {
    const codes = (conditions: Record<string, number>, rs: number) =>
      codesOf(analyseChange(topology, { parts: { ...parts, rs }, conditions }));
    expect(codes(pulse, 470)).not.toContain("charge-current");
    expect(codes(pulse, 100)).toContain("charge-current");
    expect(codes({ biasCurrent: 200e-9 }, 470)).toContain("pedestal");
    expect(codes({ biasCurrent: 200e-12 }, 470)).not.toContain("pedestal");
  });
});
