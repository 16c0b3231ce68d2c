import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { analyseStage, defaultParts, designExactly, isRefusal, type PlainConditions } from "#lib/circuit/index.ts";
import { otaCell } from "#lib/circuit/kinds/ota-cell/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { logarithmic, runs } from "../../support/random.ts";

const topology = otaCell.topologies[0]!;
const figures = (conditions: PlainConditions, parts = {}) =>
  analyseStage(topology, { parts: { ...defaultParts(topology), ...parts }, conditions }).results as Record<
    string,
    number
  >;

const bias = logarithmic(1e-9, 2e-3);
const peak = logarithmic(0.03, 5);
const diodeCurrent = logarithmic(20e-6, 1.5e-3);

describe("transconductance cells", () => {
  it("have a gain in proportion to the bias current, whose shape does not depend on it", () => {
    fc.assert(
      fc.property(bias, peak, diodeCurrent, (biasCurrent, sourcePeak, id) => {
        const [one, two] = [1, 0.5].map((share) =>
          figures({ biasCurrent: share * biasCurrent, sourcePeak, diodeCurrent: id }),
        );
        expectRelative(one!.gain, 2 * two!.gain!, 1e-12, "gain");
        expectRelative(one!.distortion, two!.distortion!, 1e-12, "distortion");
      }),
      runs(100),
    );
  });

  it("distort more the larger the signal, with a third-order rise for small ones", () => {
    fc.assert(
      fc.property(peak, diodeCurrent, fc.boolean(), (sourcePeak, id, on) => {
        const at = (level: number, signal: string) =>
          figures({ sourcePeak: level, signal, diodeCurrent: on ? id : 0 }).distortion!;
        for (const signal of ["sine", "noise"])
          expect(at(1.5 * sourcePeak, signal)).toBeGreaterThan(at(sourcePeak, signal));
        expectRelative(at(2e-3, "sine"), 4 * at(1e-3, "sine"), 1e-4, "twice the level");
      }),
      runs(60),
    );
  });

  it("tend to a square wave and to hard-limited noise", () => {
    const square = Math.sqrt(Math.PI ** 2 / 8 - 1);
    expectRelative(figures({ sourcePeak: 10e3 }).distortion, square, 2e-3, "sine");
    const limited = Math.sqrt(Math.PI / 2 - 1);
    expectRelative(figures({ signal: "noise", sourceRms: 10e3 }).distortion, limited, 5e-3, "noise");
  });

  it("lose by diodes in gain what they win in range, and more the more current they carry", () => {
    fc.assert(
      fc.property(diodeCurrent, logarithmic(0.1, 1), (id, level) => {
        const [off, on, more] = [0, id, 2 * id].map((diode) => figures({ diodeCurrent: diode, sourcePeak: level }));
        expectRelative(off!.gain! / on!.gain!, 1 + on!.linearity!, 1e-12, "gain");
        expect(on!.distortion!).toBeLessThan(off!.distortion!);
        expect(more!.distortion!).toBeLessThan(on!.distortion!);
        expect(Math.abs(more!.temperatureCoefficient!)).toBeLessThan(Math.abs(on!.temperatureCoefficient!));
      }),
      runs(60),
    );
  });

  it("tend to the ideal bandwidth as the op amp gets faster, from below", () => {
    fc.assert(
      fc.property(logarithmic(1e6, 1e9), (gainBandwidth) => {
        const [real, ideal] = [figures({ gainBandwidth }).bandwidth!, figures({}).bandwidth!];
        expect(real).toBeLessThan(ideal);
        expect(1 - real / ideal).toBeLessThan((ideal / gainBandwidth) ** 2);
      }),
      runs(60),
    );
  });

  it("are solved for a gain that the analysis then shows", () => {
    fc.assert(
      fc.property(logarithmic(0.1, 50), bias, diodeCurrent, (gain, biasCurrent, id) => {
        const conditions = { biasCurrent, diodeCurrent: id };
        const parts = designExactly(topology, { gain }, conditions, { rin: 33e3, rsh: 1e3 });
        if (isRefusal(parts)) return expect.fail(parts.message);
        expectRelative(figures(conditions, parts).gain, gain, 1e-12, "gain");
      }),
      runs(60),
    );
  });
});
