import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Complex } from "#lib/circuit/network/complex.ts";
import { findRoots } from "#lib/circuit/network/roots.ts";
import { multiply } from "#lib/circuit/network/polynomial.ts";
import { logarithmic, runs } from "../support/random.ts";

const ascending = (a: Complex, b: Complex) => Math.hypot(a.re, a.im) - Math.hypot(b.re, b.im) || a.im - b.im;

/** The coefficients that the roots multiply out to, scaled to the given leading one. */
function expand(roots: readonly Complex[], leading: number): { value: number; size: number }[] {
  let product: Complex[] = [{ re: leading, im: 0 }];
  let sizes = [Math.abs(leading)];
  for (const { re, im } of roots) {
    const next = Array.from({ length: product.length + 1 }, () => ({ re: 0, im: 0 }));
    const nextSizes = new Array<number>(product.length + 1).fill(0);
    for (const [i, c] of product.entries()) {
      next[i + 1]!.re += c.re;
      next[i + 1]!.im += c.im;
      next[i]!.re -= c.re * re - c.im * im;
      next[i]!.im -= c.re * im + c.im * re;
      nextSizes[i + 1]! += sizes[i]!;
      nextSizes[i]! += sizes[i]! * Math.hypot(re, im);
    }
    [product, sizes] = [next, nextSizes];
  }
  return product.map((c, i) => ({ value: c.re, size: sizes[i]! }));
}

describe("findRoots", () => {
  it.each([
    [[-1, 1], [1]],
    [
      [2, -3, 1],
      [1, 2],
    ],
    [
      [-6, 11, -6, 1],
      [1, 2, 3],
    ],
    [
      [0, 0, -4, 2],
      [0, 0, 2],
    ],
    [
      [24, -50, 35, -10, 1],
      [1, 2, 3, 4],
    ],
    // Wilkinson's polynomial of degree 10.
    [multiply(...Array.from({ length: 10 }, (_, k) => [-(k + 1), 1])), Array.from({ length: 10 }, (_, k) => k + 1)],
  ] as [number[], number[]][])("finds the real roots of %j", (p, roots) => {
    const found = findRoots(p).sort(ascending);
    expect(found.length).toBe(roots.length);
    for (const [i, root] of roots.entries()) {
      expect(found[i]!.im).toBeCloseTo(0, 12);
      expect(found[i]!.re).toBeCloseTo(root, 7);
    }
  });

  it("finds the twelve roots of unity", () => {
    const found = findRoots([-1, ...new Array<number>(11).fill(0), 1]);
    for (const { re, im } of found) {
      expect(Math.hypot(re, im)).toBeCloseTo(1, 13);
      expect((Math.atan2(im, re) * 6) / Math.PI).toBeCloseTo(Math.round((Math.atan2(im, re) * 6) / Math.PI), 11);
    }
    expect(new Set(found.map(({ re, im }) => Math.round((Math.atan2(im, re) * 6) / Math.PI) % 12)).size).toBe(12);
  });

  it("keeps a small root beside a large one: no cancellation", () => {
    const [small, large] = findRoots([1, 1e9, 1]).sort(ascending) as [Complex, Complex];
    expect(small.re * 1e9).toBeCloseTo(-1, 12);
    expect(large.re / 1e9).toBeCloseTo(-1, 12);
  });

  it("finds roots over forty decades to full precision", () => {
    const wanted = [1e-20, 3e-12, 7e-3, 2, 5e6, 1e13, 4e20];
    const found = findRoots(multiply(...wanted.map((r) => [r, 1])));
    for (const [i, { re, im }] of found.sort(ascending).entries()) {
      expect(im).toBe(0);
      expect(Math.abs(re / -wanted[i]! - 1)).toBeLessThan(1e-13);
    }
  });

  it("finds a resonance at 1 kHz beside a pole of 3 MHz to full precision", () => {
    const [w, q, far] = [2 * Math.PI * 1000, 15, 2 * Math.PI * 3e6];
    const found = findRoots(multiply([w * w, w / q, 1], [far, 1])).sort(ascending);
    expect(Math.abs(Math.hypot(found[0]!.re, found[0]!.im) / w - 1)).toBeLessThan(1e-13);
    expect(Math.abs(found[0]!.re / (-w / (2 * q)) - 1)).toBeLessThan(1e-12);
    expect(Math.abs((found[0]!.re - found[1]!.re) / w)).toBeLessThan(1e-14);
    expect(Math.abs((found[0]!.im + found[1]!.im) / w)).toBeLessThan(1e-14);
    expect(Math.abs(found[2]!.re / -far - 1)).toBeLessThan(1e-13);
  });

  const real = (r: number) => fc.constant([r, 1]);
  const pair = (w: number) => fc.double({ min: 0.01, max: 0.9, noNaN: true }).map((d) => [w * w, 2 * d * w, 1]);

  it("gives back the coefficients when its roots are multiplied out", () => {
    const radii = fc.uniqueArray(fc.integer({ min: -18, max: 18 }), { minLength: 1, maxLength: 4 });
    const factors = radii.chain((chosen) => fc.tuple(...chosen.map((k) => fc.oneof(real(2 ** k), pair(2 ** k)))));
    fc.assert(
      fc.property(factors, logarithmic(1e-12, 1e12), (parts, leading) => {
        const p = multiply([leading], ...parts);
        const roots = findRoots(p);
        expect(roots.length).toBe(p.length - 1);
        // Rounding of a coefficient is measured by the sum of the sizes of what it is added from.
        for (const [i, { value, size }] of expand(roots, p.at(-1)!).entries())
          expect(Math.abs(value - p[i]!) / size, `coefficient ${i} of ${p.join(" ")}`).toBeLessThan(1e-12);
      }),
      runs(500),
    );
  });

  it("finds each root of a cluster as well as the coefficients allow", () => {
    const factor = fc.oneof(logarithmic(0.5, 2).chain(real), logarithmic(0.5, 2).chain(pair), real(1));
    fc.assert(
      fc.property(fc.array(factor, { minLength: 2, maxLength: 4 }), (parts) => {
        const p = multiply(...parts);
        for (const { re, im } of findRoots(p)) {
          let [value, size] = [{ re: 0, im: 0 }, 0];
          for (const c of [...p].reverse()) {
            value = { re: value.re * re - value.im * im + c, im: value.re * im + value.im * re };
            size = size * Math.hypot(re, im) + Math.abs(c);
          }
          expect(Math.hypot(value.re, value.im) / size, `${re} + ${im}j of ${p.join(" ")}`).toBeLessThan(1e-14);
        }
      }),
      runs(500),
    );
  });

  it("ignores leading zeros and has no root of a constant", () => {
    expect(findRoots([3])).toEqual([]);
    expect(findRoots([-2, 1, 0, 0])).toEqual([{ re: 2, im: 0 }]);
    expect(findRoots([0, 0])).toEqual([]);
  });

  it("does without digits that underflow has taken, and survives coefficients hundreds of decades apart", () => {
    expect(findRoots([-2, 1, 5e-324])).toEqual([{ re: 2, im: 0 }]);
    const [near, far] = findRoots([1, 1, 1e-300]).sort(ascending) as [Complex, Complex];
    expect(near).toEqual({ re: -1, im: 0 });
    expect(far.re / -1e300).toBeCloseTo(1, 12);
  });

  it.each([[[1, Number.NaN]], [[Infinity, 1]]])("throws on %j", (p) => expect(() => findRoots(p)).toThrow(RangeError));
});
