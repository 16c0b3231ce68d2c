import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { plotStage, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { summingNode } from "#lib/circuit/kinds/summing-node/index.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { analyseChange, requestOf } from "../../support/limitCase.ts";
import { nodalTransfer, type Element } from "../../support/nodal.ts";
import { worked, workedKeys } from "../../support/published.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";

const topology = summingNode.topologies[0]!;
const results = (parts: PlainValues, conditions: PlainConditions = {}) =>
  analyseChange(topology, { parts, conditions }).results as Record<string, number>;
const listed = (parts: PlainValues, conditions: PlainConditions = {}) =>
  analyseChange(topology, { parts, conditions }).results as Record<string, number[]>;

const two = { r1: 22e3, r2: 220e3, rf: 22e3 };
/** As elsewhere the digits have a gain of 200 000 at DC besides the 3 MHz. */
const opAmp = { gainBandwidth: 3e6, openLoopGain: 200e3 };
const gainAt = (line: string) => {
  const { parts, conditions } = requestOf(topology, { parts: two, conditions: opAmp });
  const found = plotStage(topology, { parts, conditions: conditions!, curves: ["magnitude"], at: [1e3] });
  return 10 ** (found.find((one) => one.line === line)!.points[0]![1] / 20);
};
/** Levels of 1 V and 0.8 V that reach the output as such. */
const equal = { r1: 22e3, r2: 22e3, rf: 22e3 };
const levels = (correlation: number, parity2 = "even") =>
  results(equal, { level1: 1, level2: 0.8, correlation, parity2 });
/** Of a signal and its symmetric hard limiter, as the reference rounds √(2/π). */
const limited = 0.798;

const figures: Record<string, number> = {
  "sum.R1": two.r1,
  "sum.R2": two.r2,
  "sum.Rf": two.rf,
  "sum.G1": results(two)["gain1"]!,
  "sum.G2": results(two)["gain2"]!,
  "sum.NG": results(two)["noiseGain"]!,
  "sum.f3_kHz": results(two, { gainBandwidth: 3e6 })["bandwidth"]! / 1e3,
  "sum.G1_nodal": gainAt("now"),
  "sum.G2_nodal": gainAt("path-2"),
  "sum.a": 1,
  "sum.b": 0.8,
  "sum.rss_p": levels(1)["outputRms"]!,
  "sum.rss_0": levels(0)["outputRms"]!,
  "sum.rss_n": levels(1, "odd")["outputRms"]!,
  "sum.rss_pc": levels(limited)["outputRms"]!,
  "sum.rss_nc": levels(limited, "odd")["outputRms"]!,
  "sum.pol_dB": levels(limited)["parityCost"]!,
  "sum.os_mV": results(two, { offsetVoltage: 3e-3 })["outputOffset"]! * 1e3,
  "sum.pas1": listed(two, { loadResistance: 100e3 })["passiveGains"]![0]!,
  "sum.pas2": listed(two, { loadResistance: 100e3 })["passiveGains"]![1]!,
};

describe("the worked values of the summing node", () => {
  it("are all covered here", () => expect(Object.keys(figures).sort()).toEqual(workedKeys("sum.").sort()));
  it.each(Object.entries(figures))("%s is reproduced to its last digit", (key, figure) => {
    expectPrinted(figure, worked(key), key);
  });
  it("give the same three levels whatever is set", () => {
    const { outputRmsInPhase, outputRmsIndependent, outputRmsOpposed } = levels(0.5, "odd");
    expectPrinted(outputRmsInPhase, worked("sum.rss_p"), "adding");
    expectPrinted(outputRmsIndependent, worked("sum.rss_0"), "independent");
    expectPrinted(outputRmsOpposed, worked("sum.rss_n"), "opposed");
  });
});

describe("the summing node against nodal analysis", () => {
  it("has the nodal response of every path, the others grounded", () => {
    const frequencies = fc.array(logarithmic(10, 10e6), { minLength: 4, maxLength: 4 });
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), frequencies, (parts, conditions, at) => {
        const lines = plotStage(topology, { parts, conditions, curves: ["magnitude"], at });
        const fitted = [1, 2, 3, 4, 5, 6, 7, 8].filter((path) => parts[`r${path}`]! > 0);
        expect(lines.length).toBe(fitted.length);
        for (const [k, line] of lines.entries()) {
          const nodal = nodalTransfer(elementsOf(parts, conditions, fitted, fitted[k]!), "in", "o");
          for (const [i, frequency] of at.entries()) {
            const { re, im } = nodal(frequency);
            const size = Math.hypot(re, im);
            expectRelative(
              10 ** (line.points[i]![1] / 20),
              size,
              1e-9 + 1e-12 / size,
              `${line.label} at ${frequency} Hz`,
            );
          }
        }
      }),
      runs(40),
    );
  });

  it("is 3 dB down at its bandwidth", () => {
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), (parts, conditions) => {
        const { bandwidth } = results(parts, conditions);
        if (bandwidth === undefined) return;
        const [line] = plotStage(topology, {
          parts,
          conditions,
          curves: ["magnitude"],
          at: [bandwidth, 1e-6 * bandwidth],
        });
        const [[, high], [, low]] = line!.points as [[number, number], [number, number]];
        expect(low - high).toBeCloseTo(20 * Math.log10(Math.SQRT2), 6);
      }),
      runs(80),
    );
  });
});

/** The network with one path driven and the other fitted ones grounded; the drawing's own parts, source resistances added. */
function elementsOf(parts: PlainValues, conditions: PlainConditions, fitted: number[], driven: number): Element[] {
  const drawn = new Map(
    topology.network.items.flatMap((item) => (item.draw === "part" ? [[item.part, item.nodes] as const] : [])),
  );
  const paths = fitted.map((path): Element => {
    const [, to] = drawn.get(`r${path}`)!;
    const value = parts[`r${path}`]! + (conditions[`source${path}`] as number);
    return { kind: "resistor", nodes: [path === driven ? "in" : "0", to], value };
  });
  const [rf, cf] = [drawn.get("rf")!, drawn.get("cf")!];
  const amp = topology.network.items.find((item) => item.draw === "op-amp")!;
  const gainBandwidth = (conditions["gainBandwidth"] ?? null) as number | null;
  const openLoopGain = (conditions["openLoopGain"] ?? null) as number | null;
  return [
    ...paths,
    { kind: "resistor", nodes: rf, value: parts["rf"]! },
    ...(parts["cf"]! > 0 ? [{ kind: "capacitor", nodes: cf, value: parts["cf"]! } as const] : []),
    { kind: "op-amp", ...amp.nodes, gainBandwidth, openLoopGain, outputResistance: 0 },
  ];
}

describe("the level of a sum", () => {
  const level = logarithmic(0.01, 10);
  const share = fc.integer({ min: 0, max: 100 }).map((k) => k / 100);

  it("lies between the opposed and the adding one, and rises with correlation where parities are alike", () => {
    fc.assert(
      fc.property(level, level, share, share, (level1, level2, a, b) => {
        const got = results(equal, { level1, level2, correlation: a });
        expect(got["outputRms"]!).toBeLessThanOrEqual(got["outputRmsInPhase"]! * (1 + 1e-12));
        expect(got["outputRms"]!).toBeGreaterThanOrEqual(got["outputRmsOpposed"]! * (1 - 1e-9));
        const other = results(equal, { level1, level2, correlation: b });
        if (a < b) expect(got["outputRms"]!).toBeLessThanOrEqual(other["outputRms"]!);
      }),
      runs(100),
    );
  });

  it("does not notice a path without a level, but its noise gain does", () => {
    const [without, beside] = [results(equal, { level1: 1 }), results({ ...equal, r3: 22e3 }, { level1: 1 })];
    expect(beside["outputRms"]).toBe(without["outputRms"]);
    expect(beside["noiseGain"]).toBeCloseTo(without["noiseGain"]! + 1, 12);
  });
});
