import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { completeConditions, plotStage, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { noiseSource } from "#lib/circuit/kinds/noise-source/index.ts";
import { powerVariance, spreadRule } from "#lib/circuit/kinds/noise-source/model.ts";
import { integrate } from "#lib/circuit/numeric/integrate.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { netListOf, nodalTransfer, withSource } from "../../support/nodal.ts";
import { published, worked } from "../../support/published.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";

const topology = noiseSource.topologies[0]!;
const results = (parts: PlainValues = {}, conditions: PlainConditions = {}) =>
  analyseChange(topology, { parts, conditions }).results as Record<string, number>;

/** Out of the way: the worked set couples at DC. */
const coupled = { cn: 1 };
/** A noise bandwidth of 500 Hz, as the multiple-feedback example of the trade brief has. */
const band = { centreFrequency: 1000, qualityFactor: Math.PI, peakGain: 2.2727273 };
const board = results(coupled, band);
const hit = (window: number) => results(coupled, { ...band, window });

const figures: Record<string, number> = {
  "nz.e10k_nV": results({ r1: 10e3 })["thermalDensity"]! * 1e9,
  "nz.i100uA_pA": results({ rn: 50e3 })["shotDensity"]! * 1e12,
  "nz.Vrms": board["rms"]!,
  "nz.fc_k": board["gainBandwidthSingle"]! / board["gain"]! / 1e3,
  "nz.e_mV_rtHz": board["density"]! * 1e3,
  "nz.enbw": board["bandNoiseBandwidth"]!,
  "nz.Vbp_rms": board["bandRmsRule"]!,
  "nz.avg_meter_dB": 20 * Math.log10(board["meterReading"]! / board["rms"]!),
  "nz.pp999": board["peakToPeak"]! / board["rms"]!,
  "nz.cf4_dB": 20 * Math.log10(board["peak4Sigma"]! / board["rms"]!),
  "nz.noise10Vpp_rms": 5 / (board["peak4Sigma"]! / board["rms"]!),
  "nz.gain_needed": board["gain"]!,
  "nz.gain_needed_dB": board["gainDb"]!,
  "nz.gain_ft_min_MHz": board["gainBandwidthSingle"]! / 1e6,
  "nz.fluct_100ms_stat_pct": hit(0.1)["hitSpreadRule"]! * 100,
  "nz.fluct_10ms_stat_pct": hit(0.01)["hitSpreadRule"]! * 100,
  "nz.fluct_10ms_stat_dB": 20 * Math.log10(1 + hit(0.01)["hitSpreadRule"]!),
  // The set also prints what the noise bandwidth itself would give in place of the statistical one.
  "nz.fluct_10ms_pct": spreadRule(board["bandNoiseBandwidth"]!, 0.01) * 100,
  "nz.fluct_100ms_pct": spreadRule(board["bandNoiseBandwidth"]!, 0.1) * 100,
  "nz.fluct_1000ms_pct": spreadRule(board["bandNoiseBandwidth"]!, 1) * 100,
};

describe("the worked set of the noise source", () => {
  it.each(Object.entries(figures))("%s is reproduced to its last digit", (key, figure) => {
    expectPrinted(figure, worked(key), key);
  });

  it("clips as rarely as Gaussian noise does", () => {
    // A swing of four standard deviations: 10.5 V and 2.625 V RMS.
    expectPrinted(results(coupled, { sourceRms: 52.5e-3 })["clipProbability"], worked("nz.exceed_4s"), "4 σ");
    expectPrinted(results(coupled, { sourceRms: 70e-3 })["clipProbability"], worked("nz.exceed_3s"), "3 σ");
  });

  it("loses behind the band-pass what the source's pole takes, the band-pass's own op amp aside", () => {
    const { centreFrequency: _, ...rest } = band;
    const got = results(coupled, { ...rest, centreFrequency: 954.92966, qualityFactor: 3 });
    // The worked figure has a real band-pass with a 3 MHz op amp and its peak elsewhere: within a per cent.
    expectRelative(got["bandRms"], worked("nz.Vbp_num"), 1e-2, "band level");
    expect(got["bandRms"]!).toBeLessThan(got["bandRmsRule"]!);
  });

  it("spreads as the worked simulation does, within what its few thousand records leave open", () => {
    expectRelative(hit(0.1)["hitSpread"]! * 100, worked("nz.fluct_mc_pct"), 0.05, "spread");
    // The set's statistical bandwidth is a sum over a grid that ends somewhere.
    expectRelative(board["statisticalBandwidth"]! / (1000 / Math.PI), worked("nz.Bstat_over_BW"), 3e-3, "bandwidth");
  });
});

describe("published figures of noise", () => {
  const resistor = (value: number) => results({ r1: value })["thermalDensity"]!;

  it("agrees with the rule of 4 nV/√Hz for 1 kΩ", () => {
    const { given, expect: printed, rel_tol: tolerance } = published("tn-03");
    expectRelative(resistor(given["R"] as number), printed["density"] as number, tolerance, "1 kΩ");
  });

  it("agrees with 1.3 µV of 10 kΩ over 10 kHz", () => {
    const { given, expect: printed, rel_tol: tolerance } = published("thermal-10k");
    const got = resistor(given["resistance"] as number) * Math.sqrt(given["bandwidth"] as number);
    expectRelative(got, printed["rms"] as number, tolerance, "10 kΩ");
  });

  it("agrees with the shot noise of 1 µA over 10 kHz", () => {
    const { given, expect: printed, rel_tol: tolerance } = published("shot-1uA-10kHz");
    const got = results({ rn: 5 / (given["current"] as number) })["shotDensity"]!;
    expectRelative(got * Math.sqrt(given["bandwidth"] as number), printed["rms"] as number, tolerance, "1 µA");
  });
});

describe("the board against nodal analysis of its drawn network", () => {
  it("has the nodal density over random parts and surroundings", () => {
    const frequencies = fc.array(logarithmic(1, 1e6), { minLength: 5, maxLength: 5 });
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), frequencies, (parts, given, at) => {
        const conditions = completeConditions(topology, given) as Record<string, number | null>;
        const { gainBandwidth, sourceResistance, sourceRms, bandLimit } = conditions;
        const opAmp = { gainBandwidth: gainBandwidth!, openLoopGain: null, outputResistance: 0 };
        // The junction drives its node through the source resistance; R_n was there when it was measured.
        const items = topology.network.items.filter((item) => !("part" in item && item.part === "rn"));
        const elements = netListOf({ ...topology.network, items }, parts, opAmp);
        const nodal = nodalTransfer(withSource(elements, "e", "junction", sourceResistance!), "junction", "out");
        const line = plotStage(topology, { parts, conditions: given, curves: ["density"], at })[0]!;
        const density = sourceRms! / Math.sqrt((Math.PI / 2) * bandLimit!);
        for (const [i, frequency] of at.entries()) {
          const { re, im } = nodal(frequency);
          const wanted = (density * Math.hypot(re, im)) / Math.hypot(1, frequency / bandLimit!);
          expectRelative(line.points[i]![1], wanted, 1e-9, `${frequency} Hz`);
        }
      }),
      runs(60),
    );
  });
});

interface Given {
  rms: number;
  limit: number;
  rs: number;
  cn: number;
  r1: number;
  rf1: number;
  r2: number;
  rf2: number;
  ft: number;
  f0: number;
  q: number;
  h0: number;
  window: number;
}

describe("the board against scipy", () => {
  const { cases } = committed<Given, Record<"rms" | "bandRms" | "hitSpread", number>>("noise_source");
  it.each(cases.map((one) => [one.given.id, one] as const))(
    "levels and spread of %s",
    (_, { given, figures: wanted }) => {
      const got = results(
        { cn: given.cn, r1: given.r1, rf1: given.rf1, r2: given.r2, rf2: given.rf2 },
        {
          sourceRms: given.rms,
          bandLimit: given.limit,
          sourceResistance: given.rs,
          gainBandwidth: given.ft,
          centreFrequency: given.f0,
          qualityFactor: given.q,
          peakGain: given.h0,
          window: given.window,
        },
      );
      expectRelative(got["rms"], wanted.rms, 1e-8, "rms");
      expectRelative(got["bandRms"], wanted.bandRms, 1e-8, "bandRms");
      // Moved apart by 1e-5 where the damping is critical.
      expectRelative(got["hitSpread"], wanted.hitSpread, given.q === 0.5 ? 1e-5 : 1e-8, "hitSpread");
    },
  );
  itGivesTheCommittedFiguresAgain("noise_source", 1e-8);
});

const [centre, quality, window] = [logarithmic(20, 20e3), logarithmic(0.3, 50), logarithmic(1e-3, 10)];

describe("noise", () => {
  it("keeps its level behind a band-pass retuned at constant bandwidth, if it is flat", () => {
    fc.assert(
      fc.property(centre, quality, logarithmic(0.25, 4), (f, q, ratio) => {
        const level = (by: number) => results({}, { centreFrequency: f * by, qualityFactor: q * by })["bandRmsRule"];
        expectRelative(level(ratio), level(1)!, 1e-12, `${f} Hz`);
      }),
      runs(60),
    );
  });

  it("adds in power: twice the density is twice the level, four times the band is twice the level", () => {
    expectRelative(results(coupled, { sourceRms: 40e-3 })["rms"], 2, 1e-7, "density");
    const narrow = { sourceRms: 10e-3, bandLimit: 5e3 };
    expectRelative(results(coupled, narrow)["density"], board["density"]!, 1e-12, "same density");
    expectRelative(results(coupled, narrow)["rms"], 0.5, 1e-6, "a quarter of the band");
  });

  it("spreads less over a longer hit, and never by more than a sample of it would", () => {
    fc.assert(
      fc.property(centre, quality, window, (f, q, time) => {
        const [short, long] = [powerVariance(f, q, time), powerVariance(f, q, 2 * time)];
        expect(long).toBeLessThan(short * (1 + 1e-9));
        // One sample of Gaussian noise has a variance of power of two.
        expect(short).toBeLessThan(2 * (1 + 1e-9));
        expect(short).toBeGreaterThan(0);
      }),
      runs(200),
    );
  });

  it("spreads as its autocorrelation, integrated numerically, has it", () => {
    fc.assert(
      fc.property(
        centre,
        fc.constantFrom(0.4, 0.499, 0.501, 0.7, 3, 12),
        fc.constantFrom(0.3, 3, 30),
        (f, q, swings) => {
          const omega = 2 * Math.PI * f;
          const decay = omega / 2 / q;
          const squared = omega ** 2 - decay ** 2;
          const rate = Math.sqrt(Math.abs(squared));
          const [even, odd] = squared > 0 ? [Math.cos, Math.sin] : [Math.cosh, Math.sinh];
          const rho = (t: number) => Math.exp(-decay * t) * (even(rate * t) - (decay / rate) * odd(rate * t));
          const time = swings / f;
          const reach = Math.min(time, 40 / (squared > 0 ? decay : decay - rate));
          const integral = integrate((t) => (1 - t / time) * rho(t) ** 2, 0, reach, 1e-9);
          expectRelative(powerVariance(f, q, time), (4 / time) * integral, 1e-7, `${f} Hz, Q ${q}`);
        },
      ),
      runs(60),
    );
  });

  it("tends to the rule as hits grow long", () => {
    const { hitSpread, hitSpreadRule } = results({}, { window: 10, centreFrequency: 1000, qualityFactor: 3 });
    expectRelative(hitSpread, hitSpreadRule!, 2e-4, "10 s");
  });

  it("of ideal op amps is the limit of ever faster ones", () => {
    const ideal = results()["rms"]!;
    const errors = [1e6, 10e6, 100e6].map((gainBandwidth) =>
      Math.abs(results({}, { gainBandwidth })["rms"]! / ideal - 1),
    );
    expect(errors[1]!).toBeLessThan(errors[0]!);
    expect(errors[2]!).toBeLessThan(errors[1]!);
    expect(errors[2]!).toBeLessThan(1e-2);
  });
});
