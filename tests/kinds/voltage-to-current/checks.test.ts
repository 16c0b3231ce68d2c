import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { analyseStage, defaultParts, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { voltageToCurrent } from "#lib/circuit/kinds/voltage-to-current/index.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { worked, workedKeys } from "../../support/published.ts";
import { logarithmic, runs } from "../../support/random.ts";
import { hasScipy, rerunScipy, scipyReference } from "../../support/scipyReference.ts";

const figures = (id: string, conditions: PlainConditions, parts: PlainValues = {}) => {
  const topology = voltageToCurrent.topologies.find((one) => one.id === id)!;
  const request = { parts: { ...defaultParts(topology), ...parts }, conditions };
  return analyseStage(topology, request).results as Record<string, number>;
};
const driver = (conditions: PlainConditions, parts: PlainValues = {}) =>
  figures("op-amp-transistor", { controlVoltage: 7.8, ...conditions }, { re: 15.5e3, ...parts });
const resistor = (conditions: PlainConditions = {}) =>
  figures("resistor", { controlVoltage: 7.8, ...conditions }, { r: 37e3 });

const got: Record<string, () => number> = {
  "vi.Venv": () => 7.8,
  "vi.RE": () => 15.5e3,
  "vi.I_uA": () => driver({}).outputCurrent! * 1e6,
  "vi.beta": () => 200,
  "vi.Ic_uA": () => driver({ beta: 200 }).outputCurrent! * 1e6,
  "vi.base_err_pct": () => driver({ beta: 200 }).baseCurrentError! * 100,
  "vi.floor_uA": () => driver({ offsetVoltage: 3e-3 }).floorCurrent! * 1e6,
  "vi.floor_dB": () => driver({ offsetVoltage: 3e-3 }).floorDb!,
  // An op amp with JFET inputs takes no current from the envelope.
  "vi.bias_err_pct": () => 100 * (driver({}).outputCurrent! / (7.8 / 15.5e3) - 1),
  "vi.Vpin": () => resistor().pinVoltage!,
  "vi.Vpin_lo": () => resistor({ pinAboveRail: 1.2 }).pinVoltage!,
  "vi.Vpin_hi": () => resistor({ pinAboveRail: 1.4 }).pinVoltage!,
  "vi.Rsimple_k": () => (7.8 - resistor().pinVoltage!) / resistor().outputCurrent! / 1e3,
  "vi.Isimple_rest_uA": () => resistor().floorCurrent! * 1e6,
  "vi.simple_range_dB": () => -resistor().floorDb!,
  "vi.Rlim_max_k": () => driver({}).limitResistance! / 1e3,
  "vi.I_fault_uA": () => driver({}).faultCurrent! * 1e6,
  "vi.I_fault_8k2_uA": () => driver({}, { re: 8.2e3 }).faultCurrent! * 1e6,
  // 0.5 V across the mirror's emitter resistor.
  "vi.VCE_min": () => driver({ mirrorDegeneration: 0.5 / driver({}).outputCurrent! }).headroom!,
  "vi.recover_us": () => driver({ slewRate: 13e6 }).recoveryTime! * 1e6,
  "vi.simple_tc_ppm": () => resistor().temperatureCoefficient! * 1e6,
};

describe("worked values of the voltage-to-current converter", () => {
  it("are all checked here", () => expect(workedKeys("vi.").sort()).toEqual(Object.keys(got).sort()));
  it.each(Object.keys(got))("%s", (key) => {
    if (worked(key) === 0) expect(Math.abs(got[key]!())).toBeLessThan(1e-9);
    else expectPrinted(got[key]!(), worked(key), key);
  });
});

interface Given {
  re: number;
  beta: number;
  venv: number;
  vos: number;
  rb: number;
}
const committed = scipyReference<Given, { outputCurrent: number }>("voltage_to_current");

describe("the loop against Kirchhoff's laws solved by scipy", () => {
  it.each(committed.cases.map((one) => [one.given.id, one] as const))(
    "agrees for %s",
    (id, { given, figures: wanted }) => {
      const { re, beta, venv, vos, rb } = given;
      const conditions = { controlVoltage: venv, beta, offsetVoltage: vos, baseResistance: rb };
      expectRelative(driver(conditions, { re }).outputCurrent, wanted.outputCurrent, 1e-6, id);
    },
  );

  it.runIf(hasScipy)("finds the committed figures again", { timeout: 60_000 }, async () => {
    const again = await rerunScipy<Given, { outputCurrent: number }>("voltage_to_current");
    for (const [k, { given, figures: found }] of again.cases.entries())
      expectRelative(found.outputCurrent, committed.cases[k]!.figures.outputCurrent, 1e-9, given.id);
  });
});

describe("converters", () => {
  it("follow the control voltage in proportion until they saturate, and never turn back", () => {
    fc.assert(
      fc.property(logarithmic(1e3, 220e3), logarithmic(40, 600), logarithmic(0.1, 4), (re, beta, volts) => {
        const at = (controlVoltage: number) => driver({ controlVoltage, beta }, { re }).outputCurrent!;
        expectRelative(at(2 * volts), 2 * at(volts), 1e-12, "twice the voltage");
        expect(at(20)).toBeGreaterThanOrEqual(at(9));
        expect(at(20)).toBe(at(30));
      }),
      runs(100),
    );
  });

  it("pass a resistor's current in inverse proportion to it", () => {
    fc.assert(
      fc.property(logarithmic(4.7e3, 470e3), logarithmic(1, 10), (r, controlVoltage) => {
        const [one, two] = [r, 2 * r].map((ohms) => figures("resistor", { controlVoltage }, { r: ohms }));
        expectRelative(one!.outputCurrent, 2 * two!.outputCurrent!, 1e-12, "half the resistance");
        expect(one!.outputCurrent!).toBeGreaterThan(one!.floorCurrent!);
      }),
      runs(100),
    );
  });
});
