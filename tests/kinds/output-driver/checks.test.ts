import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { completeConditions, plotStage, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { outputDriver } from "#lib/circuit/kinds/output-driver/index.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { netListOf, nodalTransfer, withSource, type Element } from "../../support/nodal.ts";
import { worked, workedKeys } from "../../support/published.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";

const topologyOf = (id: string) => outputDriver.topologies.find((topology) => topology.id === id)!;
const results = (parts: PlainValues, conditions: PlainConditions = {}, id = "inverting") =>
  analyseChange(topologyOf(id), { parts, conditions }).results as Record<string, number>;

const driver = { ri: 10e3, rf: 20e3, ro: 1e3 };
const loaded = (loads: number) => results(driver, { loadResistance: 100e3, loads });
/** A swing of exactly 10 V. */
const ten = { elementDrop: 0.5 };
const noisy = results(driver, { inputNoise: 18e-9, sourceRms: 0.625 });
/** 10 Vpp as a sine, through a gain of 2. */
const sine = results(driver, { signal: "sine", sourceRms: 5 / Math.SQRT2 / 2 });

const figures: Record<string, number> = {
  "out.Rf": driver.rf,
  "out.Ri": driver.ri,
  "out.A": results(driver)["gain"]!,
  "out.A_dB": results(driver)["gainDb"]!,
  "out.f3_kHz": results(driver, { gainBandwidth: 3e6 })["bandwidth"]! / 1e3,
  "out.Ro": driver.ro,
  "out.Rl": 100e3,
  "out.loss_dB": loaded(1)["loadLossDb"]!,
  "out.loss_3_dB": loaded(3)["loadLossDb"]!,
  "out.Isc_mA": results(driver)["shortCircuitCurrent"]! * 1e3,
  "out.P_Ro_mW": results(driver)["shortCircuitPower"]! * 1e3,
  "out.fc_in_Hz": results({ ...driver, cin: 1e-6 })["couplingCorner"]!,
  "out.fc_out_Hz": results({ ...driver, cout: 10e-6 }, { loadResistance: 100e3 })["outputCorner"]!,
  "out.clip_rail": results(driver, { elementDrop: 0.3 })["swing"]!,
  "out.sig_max_rms": results(driver, { elementDrop: 0.3 })["largestRms"]!,
  "out.sr_fmax_13": results(driver, { ...ten, slewRate: 13e6 })["slewLimit"]! / 1e3,
  "out.sr_fmax_05": results(driver, { ...ten, slewRate: 0.5e6 })["slewLimit"]! / 1e3,
  "out.dBu_sine": sine["outputDbu"]!,
  "out.dBu_noise": noisy["outputDbu"]!,
  "out.fc_lp_cable_kHz": results(driver, { cableCapacitance: 1e-9 })["cableCorner"]! / 1e3,
  "out.noise_uV": noisy["noiseFloor"]! * 1e6,
  "out.SNR_dB": noisy["signalToNoiseDb"]!,
};

/** The reference rounds 0 dBu to 0.7746 V. */
const goodDigits: Record<string, number> = { "out.dBu_sine": 5, "out.dBu_noise": 5 };

describe("the worked values of the output driver", () => {
  it("are all covered here", () => expect(Object.keys(figures).sort()).toEqual(workedKeys("out.").sort()));
  it.each(Object.entries(figures))("%s is reproduced to its last digit", (key, figure) => {
    expectPrinted(figure, worked(key), key, goodDigits[key]);
  });
});

describe.each(["inverting", "non-inverting"])("the %s driver against nodal analysis of its drawn network", (id) => {
  const topology = topologyOf(id);

  it("has the nodal magnitude at the jack, over random parts and surroundings", () => {
    const frequencies = fc.array(logarithmic(1, 10e6), { minLength: 6, maxLength: 6 });
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), frequencies, (parts, given, at) => {
        const nodal = nodalTransfer(elementsOf(id, parts, given), "source", "jack");
        const line = plotStage(topology, { parts, conditions: given, curves: ["magnitude"], at })[0]!;
        for (const [i, frequency] of at.entries()) {
          const { re, im } = nodal(frequency);
          const size = Math.hypot(re, im);
          expectRelative(10 ** (line.points[i]![1] / 20), size, 1e-9 + 1e-11 / size, `${frequency} Hz`);
        }
      }),
      runs(60),
    );
  });

  it("has the gain of the curve in the middle of the band, and the noise of its level", () => {
    const parts = { cin: 100e-6, rf: 47e3, ...(id === "non-inverting" && { rb: 100e3 }) };
    const conditions = { gainBandwidth: 1e9, openLoopGain: 1e5, sourceResistance: 1e3 };
    const got = results(parts, conditions, id);
    const state = {
      parts: { ...Object.fromEntries(Object.entries(topology.parts).map(([k, f]) => [k, f.default])), ...parts },
    };
    const line = plotStage(topology, { ...state, conditions, curves: ["magnitude"], at: [1e3] })[0]!;
    expect(line.points[0]![1]).toBeCloseTo(got["gainDb"]!, 4);
  });
});

/** The drawing's own parts, with source, load and cable; a capacitor that is not fitted is a wire, a bias resistor nothing. */
function elementsOf(id: string, parts: PlainValues, given: PlainConditions): Element[] {
  const conditions = completeConditions(topologyOf(id), given) as Record<string, number | null>;
  const { loadResistance, loads, cableCapacitance, gainBandwidth, openLoopGain, sourceResistance } = conditions;
  const opAmp = { gainBandwidth: gainBandwidth!, openLoopGain: openLoopGain!, outputResistance: 0 };
  const network = topologyOf(id).network;
  const fitted = network.items.filter((item) => !("part" in item && item.part === "rb" && parts["rb"] === 0));
  const elements: Element[] = netListOf({ ...network, items: fitted }, parts, opAmp);
  if (loadResistance !== null)
    elements.push({ kind: "resistor", nodes: ["jack", "0"], value: loadResistance! / loads! });
  if (cableCapacitance! > 0) elements.push({ kind: "capacitor", nodes: ["jack", "0"], value: cableCapacitance! });
  const behindWire = id === "inverting" ? "i" : "p";
  return withSource(elements, parts["cin"] === 0 ? behindWire : "in", "source", sourceResistance!);
}

describe("clipping", () => {
  it("takes 63 ppm of the time at four standard deviations, and falls as the swing grows", () => {
    const at = (sourceRms: number) => results(driver, { ...ten, sourceRms })["clipProbability"]!;
    expectPrinted(at(1.25), worked("nz.exceed_4s"), "four standard deviations");
    expect(at(1.2)).toBeLessThan(at(1.25));
    expect(results(driver, { ...ten, sourceRms: 1.25 })["headroomDb"]).toBeCloseTo(0, 12);
  });

  it("of a sine is all or nothing", () => {
    const at = (sourceRms: number) => results(driver, { ...ten, signal: "sine", sourceRms })["clipProbability"];
    expect([at(3.5), at(3.6)]).toEqual([0, 1]);
  });
});
