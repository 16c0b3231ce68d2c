import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { analyseStage, designExactly, isRefusal, type PlainConditions } from "#lib/circuit/index.ts";
import { currentMirror } from "#lib/circuit/kinds/current-mirror/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { logarithmic, runs } from "../../support/random.ts";

const topologyOf = (id: string) => currentMirror.topologies.find((one) => one.id === id)!;
const figures = (topology: string, conditions: PlainConditions, parts = {}) =>
  analyseStage(topologyOf(topology), { parts, conditions }).results as Record<string, number | undefined>;

const current = logarithmic(0.1e-6, 2e-3);
const gain = logarithmic(40, 600);
const early = logarithmic(20, 200);

describe("current mirrors", () => {
  it("copy exactly with ideal transistors, at any current and temperature", () => {
    fc.assert(
      fc.property(fc.constantFrom("simple", "wilson"), current, fc.integer({ min: 273, max: 333 }), (id, i, t) => {
        expectRelative(figures(id, { referenceCurrent: i, temperature: t }).ratio, 1, 1e-12, id);
      }),
      runs(100),
    );
  });

  it("share base current as n/(1 + (1 + n)/β), and lose β + 1 times less with a follower", () => {
    fc.assert(
      fc.property(gain, fc.integer({ min: 1, max: 8 }), (beta, outputs) => {
        const loss = (1 + outputs) / beta;
        expectRelative(figures("simple", { beta, outputs }).ratio, 1 / (1 + loss), 1e-12, "shared");
        const helped = figures("simple", { beta, outputs, baseHelper: "follower" }).ratio;
        expectRelative(helped, 1 / (1 + loss / (beta + 1)), 1e-12, "follower");
      }),
      runs(100),
    );
  });

  it("tend to the ratio of the resistors as their drop grows", () => {
    fc.assert(
      fc.property(logarithmic(0.2, 4), (ratio) => {
        const error = (i: number) =>
          Math.abs(
            figures(
              "degenerated",
              { referenceCurrent: i, outputVoltage: -40, railPositive: 40 },
              { r1: 4700, r2: 4700 / ratio },
            ).junctionError!,
          );
        expect(error(1e-3)).toBeLessThanOrEqual(error(1e-5) + 1e-12);
        expect(error(1e-3)).toBeLessThan(0.02);
      }),
      runs(60),
    );
  });

  it("deliver more the lower the output is held, and less the larger R2 is", () => {
    fc.assert(
      fc.property(current, gain, early, logarithmic(50, 4700), (referenceCurrent, beta, earlyVoltage, r) => {
        const at = (outputVoltage: number, r2: number) =>
          figures(
            "degenerated",
            { referenceCurrent, beta, earlyVoltage, outputVoltage, railPositive: 18 },
            { r1: r, r2 },
          ).outputCurrent;
        const [high, low, less] = [at(0, r), at(-10, r), at(-10, 2 * r)];
        fc.pre(high !== undefined);
        expect(low).toBeGreaterThan(high!);
        expect(less).toBeLessThan(low!);
      }),
      runs(100),
    );
  });

  it("stand stiffer the more they are degenerated, a Wilson mirror near β·ro/2", () => {
    // β·ro/2 leaves out shares near 2/β and β·VT/(2·VA).
    fc.assert(
      fc.property(gain, early, (beta, earlyVoltage) => {
        const conditions = { beta, earlyVoltage, outputVoltage: 0 };
        const of = (r: number) => figures("degenerated", conditions, { r1: r, r2: r }).outputResistance!;
        expect(of(100)).toBeGreaterThan(figures("simple", conditions).outputResistance!);
        expect(of(1000)).toBeGreaterThan(of(100));
        const wilson = figures("wilson", conditions);
        const inner = (earlyVoltage + wilson.collectorEmitterVoltage!) / wilson.outputCurrent!;
        expectRelative(
          wilson.outputResistance,
          (beta * inner) / 2,
          2 / beta + (beta * 25.7e-3) / (2 * earlyVoltage),
          "β·ro/2",
        );
      }),
      runs(100),
    );
  });

  it("are solved for a ratio that the exact analysis then shows", () => {
    fc.assert(
      fc.property(logarithmic(0.3, 3), gain, early, (ratio, beta, earlyVoltage) => {
        const conditions = { beta, earlyVoltage, referenceCurrent: 300e-6 };
        const parts = designExactly(topologyOf("degenerated"), { ratio }, conditions, { r1: 1000 });
        if (isRefusal(parts)) return expect.fail(parts.message);
        expectRelative(figures("degenerated", conditions, parts).ratio, ratio, 1e-9, "ratio");
      }),
      runs(60),
    );
  });

  it("refuse a ratio that no resistor reaches, and say which can", () => {
    const refusal = designExactly(topologyOf("degenerated"), { ratio: 5 }, { referenceCurrent: 1e-6 }, { r1: 100 });
    expect(refusal).toMatchObject({ refused: true, field: "ratio" });
    expect(designExactly(topologyOf("simple"), { ratio: 2 }, {}, {})).toMatchObject({ refused: true, field: "ratio" });
    expect(designExactly(topologyOf("wilson"), { ratio: 1 }, {}, {})).toEqual({});
  });
});
