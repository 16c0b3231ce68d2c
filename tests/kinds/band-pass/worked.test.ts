import { describe, expect, it } from "vitest";
import { sensitivities, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { noiseAfter } from "#lib/circuit/kinds/band-pass/model.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { idealResistors } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/model.ts";
import { transferAt } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/analyse.ts";
import { multiply } from "#lib/circuit/network/polynomial.ts";
import { noiseIntegral } from "#lib/circuit/network/noiseIntegral.ts";
import { polesOf } from "#lib/circuit/network/transfer.ts";
import { expectPrinted } from "../../support/approx.ts";
import { analyseChange, requestOf } from "../../support/limitCase.ts";
import { worked, workedKeys } from "../../support/published.ts";

const chosen = { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 };
/**
 * The op amp of the worked values: their text says 3 MHz, their digits also have a gain of 200 000 at DC, without which
 * the peak gain would be 2.27272 instead of 2.27251.
 */
const opAmp = { gainBandwidth: 3e6, openLoopGain: 200e3 };

const results = (conditions: PlainConditions = {}, parts: PlainValues = chosen) =>
  analyseChange(multipleFeedback, { parts, conditions }).results as Record<string, number>;

const transfer = (parts: PlainValues, conditions: PlainConditions) =>
  transferAt(requestOf(multipleFeedback, { parts, conditions }) as never);

/** The resonant pair of poles as centre and Q, relative to the wanted ones, in per cent. */
function poleError(parts: PlainValues, conditions: PlainConditions, centre: number, quality: number) {
  const pole = polesOf(transfer(parts, conditions)).find(({ im }) => im > 0)!;
  const size = Math.hypot(pole.re, pole.im);
  return { centre: percent(size / (2 * Math.PI), centre), quality: percent(size / (-2 * pole.re), quality) };
}
const percent = (got: number, of: number) => 100 * (got / of - 1);

/** All parts at one end of their tolerance: C 5 %, R 1 %, pot 20 %. */
const corner = (sign: 1 | -1): PlainValues => ({
  ra: chosen.ra * (1 + sign * 0.01),
  rb: chosen.rb * (1 + sign * 0.01),
  rbPot: chosen.rbPot * (1 + sign * 0.2),
  rf: chosen.rf * (1 + sign * 0.01),
  c1: chosen.c1 * (1 + sign * 0.05),
  c2: chosen.c2 * (1 + sign * 0.05),
});

const exact = idealResistors(1000, 3, 2, 10e-9, 10e-9);
const mid = { centre: results()["centreFrequency"]!, quality: results()["qualityFactor"]! };
const stress = {
  centre: 5000,
  quality: 10,
  parts: { rbPot: 0, c1: 1e-9, c2: 1e-9, ...idealResistors(5000, 10, 2, 1e-9, 1e-9) },
};
const slow = { ...opAmp, gainBandwidth: 1e6 };
const noisy = { sourceRms: 1, sourceBandwidth: 20e3 };
const seen = results({ sourceResistance: 12.5e3 });

const figures: Record<string, number> = {
  "mfb.RA": chosen.ra,
  "mfb.RF": chosen.rf,
  "mfb.C_nF": chosen.c1 * 1e9,
  "mfb.RBfix": chosen.rb,
  "mfb.RBpot": chosen.rbPot,
  "mfb.d_RF_k": exact.rf / 1e3,
  "mfb.d_RA_k": exact.ra / 1e3,
  "mfb.d_RB_k": exact.rb / 1e3,
  ...Object.fromEntries(
    [["hi", 0] as const, ["mid", 0.5] as const, ["lo", 1] as const].flatMap(([name, rotation]) => {
      const [ideal, real] = [results({ rotation }), results({ rotation, ...opAmp })];
      return [
        [`mfb.f0_${name}`, ideal["centreFrequency"]],
        [`mfb.Q_${name}`, ideal["qualityFactor"]],
        [`mfb.f0_${name}_nodal`, ideal["centreFrequency"]],
        [`mfb.Q_${name}_nodal`, ideal["qualityFactor"]],
        [`mfb.f0_${name}_ft3M`, real["centreFrequency"]],
        [`mfb.Q_${name}_ft3M`, real["qualityFactor"]],
        [`mfb.H0_${name}_ft3M`, real["peakGain"]],
      ];
    }),
  ),
  "mfb.H0": results()["peakGain"]!,
  "mfb.H0_dB": results()["peakGainDb"]!,
  "mfb.BW": results()["bandwidth"]!,
  "mfb.span_semitones": results()["retuneSpan"]!,
  "mfb.cents_per_deg": results()["retunePerDegree"]!,
  "mfb.Sf_RB": sensitivities(multipleFeedback, { ...chosen, rb: 3200, rbPot: 0 }, {}, "centreFrequency")["rb"]!,
  "mfb.NG": results({ rotation: 0 })["noiseGain"]!,
  "mfb.loop": results({ rotation: 0, ...opAmp })["loopGain"]!,
  "mfb.pole_f_err_pct": poleError(chosen, opAmp, mid.centre, mid.quality).centre,
  "mfb.pole_Q_err_pct": poleError(chosen, opAmp, mid.centre, mid.quality).quality,
  "mfb.form_f_err_pct": (-100 * mid.quality * mid.centre) / 3e6,
  "mfb.form_Q_err_pct": (100 * mid.quality * mid.centre) / 3e6,
  "mfb.s_pole_f_err_pct": poleError(stress.parts, slow, stress.centre, stress.quality).centre,
  "mfb.s_pole_Q_err_pct": poleError(stress.parts, slow, stress.centre, stress.quality).quality,
  "mfb.s_form_f_err_pct": 100 * (1 / Math.sqrt(1 + (2 * stress.quality * stress.centre) / 1e6) - 1),
  "mfb.s_form_Q_err_pct": 100 * (Math.sqrt(1 + (2 * stress.quality * stress.centre) / 1e6) - 1),
  "mfb.s_form1_f_err_pct": (-100 * stress.quality * stress.centre) / 1e6,
  "mfb.src_f_err_pct": percent(seen["centreFrequency"]!, results()["centreFrequency"]!),
  "mfb.src_gain_dB": seen["peakGainDb"]! - results()["peakGainDb"]!,
  "mfb.wc_lo_pct": percent(results({}, corner(1))["centreFrequency"]!, mid.centre),
  "mfb.wc_hi_pct": percent(results({}, corner(-1))["centreFrequency"]!, mid.centre),
  "mfb.bot_wc": results()["reachLow"]!,
  "mfb.top_wc": results()["reachHigh"]!,
};

const noise: Record<string, number> = {
  "nz.e_mV_rtHz": noiseAfter(noisy.sourceRms, noisy.sourceBandwidth, 1, 1) * 1e3,
  "nz.enbw": results()["noiseBandwidth"]!,
  "nz.Vbp_rms": results(noisy)["outputRms"]!,
  "nz.Vbp_num": bandLimitedNoise(),
};

/** Volts RMS after the real network of noise that one pole limits, by the integral over their product. */
function bandLimitedNoise(): number {
  const { numerator, denominator } = transfer(chosen, opAmp);
  const limited = { numerator, denominator: multiply(denominator, [1, 1 / (2 * Math.PI * noisy.sourceBandwidth)]) };
  return Math.sqrt(noiseIntegral(limited) / ((Math.PI / 2) * noisy.sourceBandwidth));
}

/**
 * Figures whose reference was itself searched for on the flat top of a curve, or is a difference of such, and so has
 * fewer good digits than the eight it is written with.
 */
const goodDigits: Record<string, number> = {
  "mfb.f0_hi_ft3M": 7,
  "mfb.f0_mid_ft3M": 7,
  "mfb.f0_lo_ft3M": 7,
  "mfb.f0_lo_nodal": 7,
  "mfb.Q_lo_nodal": 7,
  // A numeric integral over a finite range.
  "nz.Vbp_num": 6,
};

describe("the worked values of the multiple-feedback band-pass", () => {
  it("are all covered here", () => {
    expect(Object.keys(figures).sort()).toEqual(workedKeys("mfb.").sort());
  });

  it.each(Object.entries({ ...figures, ...noise }))("%s is reproduced to its last good digit", (key, figure) => {
    expectPrinted(figure, worked(key), key, goodDigits[key]);
  });

  it("need the gain at DC: without it the peak gain differs in the fifth digit", () => {
    const without = results({ gainBandwidth: 3e6 })["peakGain"]!;
    expect(Math.abs(without / worked("mfb.H0_mid_ft3M") - 1)).toBeGreaterThan(5e-5);
  });
});
