import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  isInSeries,
  nearestInSeries,
  preferredSeries,
  seriesBetween,
  seriesNames,
  stepAlongSeries,
} from "#lib/circuit/index.ts";
import { expectPrinted } from "../support/approx.ts";
import { published, worked } from "../support/published.ts";
import { logarithmic, runs } from "../support/random.ts";

describe("the preferred series of IEC 60063", () => {
  it.each(["en-01", "en-02", "en-03", "en-04", "en-06", "en-07"])("holds the list of case %s", (id) => {
    const { given, expect: wanted } = published(id);
    const name = `E${given["n"] as number}` as keyof typeof preferredSeries;
    const values = seriesBetween(name, 1, 9.999);
    expect(values).toEqual(wanted["values"]);
  });

  it("holds 192 members of E192, of which one breaks the rounding rule (case en-08)", () => {
    const { expect: wanted } = published("en-08");
    const table = preferredSeries.E192;
    expect(table.length).toBe(wanted["count"]);
    expect(table[185]! / 100).toBe(wanted["member_185"]);
    const rounded = table.map((_, i) => Math.round(100 * 10 ** (i / 192)));
    expect(rounded[185]! / 100).toBe(wanted["formula_185"]);
    expect(table.filter((value, i) => value !== rounded[i])).toEqual([920]);
  });

  it("agrees with the worked values about the lists", () => {
    const formula = (n: number, digits: number) => (i: number) => Math.round(10 ** (digits - 1) * 10 ** (i / n));
    expect(preferredSeries.E24.filter((v, i) => v !== formula(24, 2)(i)).length).toBe(worked("ser.e24_nonformula"));
    expect(preferredSeries.E96.length).toBe(worked("ser.e96_n"));
    expect(formula(192, 3)(185)).toBe(worked("ser.e192_185"));
    expect(preferredSeries.E96.indexOf(499)).toBe(worked("ser.e96_idx_4k99"));
    for (const name of ["E12", "E24", "E96"] as const) {
      const around = [...seriesBetween(name, 1, 9.99), 10];
      // Halfway by ratio between neighbours is where the nearest value is worst.
      const worst = Math.max(...around.slice(1).map((above, i) => Math.sqrt(above / around[i]!) - 1));
      const key = `ser.${name.toLowerCase()}_maxerr_pct`;
      expectPrinted(worst * 100, worked(key), key);
    }
  });

  it("nests: each of E3, E6, E12 in the next, E48 in E96 in E192", () => {
    for (const [inner, outer] of [
      ["E3", "E6"],
      ["E6", "E12"],
      ["E12", "E24"],
      ["E48", "E96"],
      ["E96", "E192"],
    ] as const)
      expect(
        preferredSeries[inner].every((v) => (preferredSeries[outer] as readonly number[]).includes(v)),
        inner,
      ).toBe(true);
  });
});

const series = fc.constantFrom(...seriesNames, "pots" as const);
const value = logarithmic(1e-12, 1e9);

describe("seriesBetween", () => {
  it("gives exact decimal values", () => {
    expect(seriesBetween("E6", 1e-9, 1e-8)).toEqual([1e-9, 1.5e-9, 2.2e-9, 3.3e-9, 4.7e-9, 6.8e-9, 1e-8]);
    expect(seriesBetween("E3", 470, 47000)).toEqual([470, 1000, 2200, 4700, 10000, 22000, 47000]);
    expect(seriesBetween("pots", 10e3, 100e3)).toEqual([10e3, 20e3, 22e3, 25e3, 47e3, 50e3, 100e3]);
    expect(seriesBetween("E3", 5, 9)).toEqual([]);
  });

  it.each([0, -1, Number.NaN, Infinity])("throws on %d", (bad) => {
    expect(() => seriesBetween("E12", bad, 10)).toThrow(RangeError);
    expect(() => stepAlongSeries(bad, "E12", 1)).toThrow(RangeError);
    expect(() => nearestInSeries(bad, "E12")).toThrow(RangeError);
  });
});

describe("stepAlongSeries", () => {
  it.each([
    [4700, "E24", 1, 5100],
    [4700, "E24", -1, 4300],
    [5000, "E24", 1, 5100],
    [5000, "E24", -1, 4700],
    [9100, "E24", 1, 10e3],
    [10e3, "E24", -1, 9100],
    [9.76e-9, "E96", 1, 10e-9],
    [50e3, "pots", 1, 100e3],
  ] as const)("steps from %d in %s by %d to %d", (from, name, direction, to) =>
    expect(stepAlongSeries(from, name, direction)).toBe(to),
  );

  it("comes back after a step up and a step down, and moves the right way", () => {
    fc.assert(
      fc.property(series, value, (name, from) => {
        const member = nearestInSeries(from, name)[0]!;
        const up = stepAlongSeries(member, name, 1);
        expect(up).toBeGreaterThan(member);
        expect(isInSeries(up, name)).toBe(true);
        expect(stepAlongSeries(up, name, -1)).toBe(member);
      }),
      runs(500),
    );
  });
});

describe("nearestInSeries", () => {
  it("is nearest by ratio, not by difference", () => {
    // 3.22 lies nearer to 2.2 than to 4.7 by difference, and farther by ratio: √(2.2 · 4.7) = 3.2156.
    expect(nearestInSeries(3.22, "E3")).toEqual([4.7]);
    expect(nearestInSeries(3.21, "E3")).toEqual([2.2]);
  });

  it("leaves out no nearer member", () => {
    fc.assert(
      fc.property(series, value, (name, wanted) => {
        const [first, second] = nearestInSeries(wanted, name, 2) as [number, number];
        const distance = (v: number) => Math.abs(Math.log(v / wanted));
        expect(distance(first)).toBeLessThanOrEqual(distance(second));
        const all = seriesBetween(name, wanted / 100, wanted * 100);
        expect(Math.min(...all.map(distance))).toBeCloseTo(distance(first), 12);
      }),
      runs(300),
    );
  });
});

describe("isInSeries", () => {
  it("knows 4.99 k of E96 and not 4.7 k", () => {
    expect(isInSeries(4990, "E96")).toBe(true);
    expect(isInSeries(4700, "E96")).toBe(false);
    expect(isInSeries(4700 * (1 + 1e-12), "E24")).toBe(true);
  });
});

describe("expectPrinted", () => {
  it("fails when the last printed digit differs", () => {
    expect(() => expectPrinted(1.00000014, 1.0000001, "x")).not.toThrow();
    expect(() => expectPrinted(1.0000002, 1.0000001, "x")).toThrow();
  });
});
