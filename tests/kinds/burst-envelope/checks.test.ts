import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { burstEnvelope } from "#lib/circuit/kinds/burst-envelope/index.ts";
import { countHits, decayedDb, gateLength, worstRatioError } from "#lib/circuit/kinds/burst-envelope/model.ts";
import type { PlainConditions, PlainValues } from "#lib/circuit/index.ts";
import { expectPrinted, expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { worked } from "../../support/published.ts";
import { conditionsOf, partsOf, runs } from "../../support/random.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";

const topology = burstEnvelope.topologies[0]!;
const parts = { rt: 75e3, ct: 100e-9, r1: 10e3, r2: 22e3, rg: 100e3, cg: 470e-9, rBurst: 40e3, cBurst: 100e-9 };
const results = (conditions: PlainConditions = {}, change: PlainValues = {}) =>
  analyseChange(topology, { parts: { ...parts, ...change }, conditions }).results as Record<string, number>;

const uneven = { outputHigh: 10.5, outputLow: -9.5 };
/** A gate of three and a half even intervals, as the brief counts them. */
const even = (capacitorTolerance: number) => {
  const restVoltage = -9.5 * (10 / 32);
  const spacing = results(uneven)["spacing"]!;
  return results({ ...uneven, restVoltage, capacitorTolerance }, { rg: (3.5 * spacing) / (470e-9 * Math.LN2) });
};

const table: [key: string, got: () => number, factor?: number][] = [
  ["burst.beta", () => results()["thresholdShare"]!],
  ["burst.T_sym_ms", () => results()["spacing"]!, 1e3],
  ["burst.th_ms", () => results(uneven)["highTime"]!, 1e3],
  ["burst.tl_ms", () => results(uneven)["lowTime"]!, 1e3],
  ["burst.T_asym_ms", () => results(uneven)["spacing"]!, 1e3],
  ["burst.first_ms", () => results(uneven)["firstInterval"]!, 1e3],
  ["burst.first_err_pct", () => results(uneven)["firstIntervalError"]!, 100],
  ["burst.fc_sp_Hz", () => results(uneven)["buzzFrequency"]!],
  ["burst.Tgate_ms", () => even(0.05)["gateLength"]!, 1e3],
  ["burst.tol_window_pct", () => even(0.05)["ratioRoom"]!, 100],
  ["burst.wc_5pct", () => even(0.05)["ratioError"]!, 100],
  ["burst.Nmin_5", () => even(0.05)["hitsLeast"]!],
  ["burst.Nmax_5", () => even(0.05)["hitsMost"]!],
  ["burst.wc_10pct", () => worstRatioError(0.01, 0.1), 100],
  ["burst.Nmin_10", () => even(0.1)["hitsLeast"]!],
  ["burst.Nmax_10", () => even(0.1)["hitsMost"]!],
  ["burst.Rg_exact_k", () => even(0.05)["gateLength"]! / gateLength(1, 470e-9, 10, 5)!, 1e-3],
  ["burst.Tgate_real_ms", () => results(uneven)["gateLength"]!, 1e3],
  ["burst.ratio_real", () => results(uneven)["gateLength"]! / results(uneven)["spacing"]!],
  ["burst.N_real", () => results(uneven)["hits"]!],
  ["burst.valley_dB", () => results(uneven)["valleyDb"]!],
  ["burst.bias_err_V", () => results({ biasCurrent: 0.2e-6 })["biasShift"]!],
];

describe("the worked set of the burst envelope", () => {
  it.each(table)("reproduces %s", (key, got, factor = 1) => expectPrinted(got() * factor, worked(key), key));
});

interface Given {
  rt: number;
  ct: number;
  r1: number;
  r2: number;
  high: number;
  low: number;
  bias: number;
  rest: number;
  gate: number;
}
interface Figures {
  highTime: number;
  lowTime: number;
  firstInterval: number;
  hitTimes: number[];
}

describe("the gated oscillator against scipy's event location", () => {
  const { cases } = committed<Given, Figures>("burst_envelope");
  it.each(cases.map((one) => [one.given.id, one] as const))("hits when %s does", (_, { given, figures }) => {
    const { rt, ct, r1, r2, high, low, bias, rest, gate } = given;
    const { results: got } = analyseChange(topology, {
      parts: { rt, ct, r1, r2, rg: gate / (470e-9 * Math.LN2), cg: 470e-9 },
      conditions: { outputHigh: high, outputLow: low, biasCurrent: bias, restVoltage: rest },
    });
    for (const key of ["highTime", "lowTime", "firstInterval"] as const)
      expectRelative(got[key], figures[key], 1e-10, key);
    expect(got["hits"]).toBe(figures.hitTimes.length);
    for (const [i, time] of figures.hitTimes.entries())
      expectRelative((got["hitTimes"] as number[])[i], time, 1e-10, `hit ${i + 1}`);
  });
  itGivesTheCommittedFiguresAgain("burst_envelope", 1e-9);
});

describe("the burst envelope", () => {
  it("rounds the gate to its count, and lists as many times in order, none past the gate", () => {
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), (random, conditions) => {
        const got = analyseChange(topology, { parts: random, conditions }).results;
        fc.pre(got["hitTimes"] !== undefined && (got["gatedHits"] as number) > 1.5);
        const times = got["hitTimes"] as number[];
        expect(times.length).toBe(got["hits"]);
        expect(Math.abs((got["gatedHits"] as number) - times.length)).toBeLessThanOrEqual(0.5 + 1e-9);
        expect([...times].sort((a, b) => a - b)).toEqual(times);
        expect(times.at(-1)).toBeLessThanOrEqual((got["gateLength"] as number) * (1 + 1e-12));
        expect(got["hitsLeast"]).toBeLessThanOrEqual(times.length);
        expect(got["hitsMost"]).toBeGreaterThanOrEqual(times.length);
      }),
      runs(200),
    );
  });

  it("scales its spacing with resistor and capacitor where no bias current flows", () => {
    fc.assert(
      fc.property(partsOf(topology), (random) => {
        const before = results({}, random)["spacing"]!;
        expectRelative(results({}, { ...random, ct: random["ct"]! * 3 })["spacing"], 3 * before, 1e-12, "C");
        expectRelative(results({}, { ...random, rt: random["rt"]! / 2 })["spacing"], before / 2, 1e-12, "R");
      }),
      runs(100),
    );
  });

  it("counts one hit in a gate shorter than the first interval, and two from there on", () => {
    expect([0.5, 0.999, 1, 1.999, 2].map((gate) => countHits(gate, 1, 1))).toEqual([1, 1, 2, 2, 3]);
  });

  it("falls by 8.686 dB a time constant", () => {
    expectPrinted(decayedDb(3, 1), (-60 / 3) * 3 * Math.log10(Math.E), "three time constants");
  });
});
