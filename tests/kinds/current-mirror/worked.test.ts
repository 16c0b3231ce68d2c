import { describe, expect, it } from "vitest";
import { analyseStage, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { currentMirror } from "#lib/circuit/kinds/current-mirror/index.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { worked, workedKeys } from "../../support/published.ts";

const figures = (topology: string, conditions: PlainConditions, parts: PlainValues = {}) =>
  analyseStage(
    currentMirror.topologies.find(({ id }) => id === topology)!,
    { parts, conditions },
  ).results as Record<string, number>;

const bench = { referenceCurrent: 500e-6, beta: 150, earlyVoltage: 50 };
const oneK = { r1: 1e3, r2: 1e3 };
const simple = figures("simple", bench);
const degenerated = (extra: PlainConditions) => figures("degenerated", { ...bench, ...extra }, oneK);
const tail = { referenceCurrent: 5e-6 };
const mismatch = (volts: number) => figures("simple", { mismatchVoltage: volts }).mismatchError! * 100;
const wilson = figures("wilson", bench);

/** Worked value by key: what the library gives, in the unit that the key names. */
const got: Record<string, () => number> = {
  "mir.Iref_uA": () => bench.referenceCurrent * 1e6,
  "mir.beta": () => bench.beta,
  "mir.VA": () => bench.earlyVoltage,
  "mir.VBE": () => figures("simple", {}).baseEmitterVoltage!,
  "mir.base_err_pct": () => figures("simple", { beta: 150 }).baseCurrentError! * 100,
  "mir.base_err_3out_pct": () => figures("simple", { beta: 150, outputs: 3 }).baseCurrentError! * 100,
  "mir.VCE_out": () => simple.collectorEmitterVoltage!,
  "mir.simple_exact_uA": () => simple.outputCurrent! * 1e6,
  "mir.mm_1mV_pct": () => mismatch(1e-3),
  "mir.mm_2mV_pct": () => mismatch(2e-3),
  "mir.mm_5mV_pct": () => mismatch(5e-3),
  "mir.dT1K_pct": () => figures("simple", { temperatureDifference: 1 }).mismatchError! * 100,
  "mir.RE": () => oneK.r1,
  "mir.VRE": () => figures("degenerated", {}, oneK).degenerationVoltage!,
  "mir.degen_exact_uA": () => degenerated({}).outputCurrent! * 1e6,
  "mir.degen_err_pct": () => degenerated({}).ratioError! * 100,
  "mir.degen_5mV_pct": () => degenerated({ mismatchVoltage: 5e-3 }).mismatchError! * 100,
  "mir.tail_err_pct": () => degenerated({}).tailError! * 100,
  "mir.tail_bend_dB": () => degenerated({}).tailBendDb!,
  "mir.tail_5mV_pct": () => degenerated({ ...tail, mismatchVoltage: 5e-3 }).mismatchError! * 100,
  "mir.ro_k": () => simple.textbookOutputResistance! / 1e3,
  "mir.rout_degen_M": () => degenerated({}).textbookOutputResistance! / 1e6,
  "mir.Rdrop_k": () => 33,
  "mir.VCE_drop": () => figures("simple", { ...bench, outputVoltage: 5.8 }).collectorEmitterVoltage!,
  "mir.drop_exact_uA": () => figures("simple", { ...bench, outputVoltage: 5.8 }).outputCurrent! * 1e6,
  "mir.ratio2": () => figures("degenerated", { referenceCurrent: 250e-6 }, { r1: 2e3, r2: 1e3 }).ratio!,
  "mir.ratio2_eq": () => figures("degenerated", { referenceCurrent: 250e-6 }, { r1: 2e3, r2: 1e3 }).ratio!,
  "mir.wilson_pct": () => wilson.baseCurrentError! * 100,
  "mir.wilson_rout_M": () => wilson.textbookOutputResistance! / 1e6,
};

/** Formulas of the brief that leave something out which the library includes: the exact figure, and how far off it may be. */
const approximated: Record<string, { exact: () => number; within: number }> = {
  // The brief takes VBE at the reference current into the ratio of Early factors.
  "mir.early_pct": { exact: () => simple.earlyError! * 100, within: 3e-5 },
  "mir.simple_formula_uA": { exact: () => simple.outputCurrent! * 1e6, within: 2e-5 },
  // ΔV/(VT + I·R) is the first term of the exact mismatch.
  "mir.degen_5mV_formula_pct": {
    exact: () => degenerated({ mismatchVoltage: 5e-3 }).mismatchError! * 100,
    within: 0.02,
  },
  // −VBE/VA with the inner pair's VBE taken alike; the output transistor's is lower by its own Early effect.
  "mir.wilson_early_pct": { exact: () => wilson.earlyError! * 100, within: 0.02 },
  // 500 µA at 22.7 V: the reference that gives this output current is smaller.
  "mir.P_mW": {
    exact: () =>
      figures("simple", { ...bench, referenceCurrent: bench.referenceCurrent ** 2 / simple.outputCurrent! })
        .dissipation! * 1e3,
    within: 2e-4,
  },
};

describe("worked values of the current mirror", () => {
  it("are all checked here", () => {
    expect(workedKeys("mir.").sort()).toEqual([...Object.keys(got), ...Object.keys(approximated)].sort());
  });

  it.each(Object.keys(got))("%s is met at eight digits", (key) => expectPrinted(got[key]!(), worked(key), key));

  it.each(Object.keys(approximated))("%s is met as far as its formula holds", (key) => {
    const { exact, within } = approximated[key]!;
    expectRelative(exact(), worked(key), within, key);
  });
});
