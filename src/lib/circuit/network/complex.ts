import type { Polynomial } from "./polynomial.ts";

/** A complex number. Plain objects and a handful of functions: all that poles and residues need. */
export interface Complex {
  re: number;
  im: number;
}

export const size = (z: Complex): number => Math.hypot(z.re, z.im);
export const plus = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
export const minus = (a: Complex, b: Complex): Complex => ({ re: a.re - b.re, im: a.im - b.im });
export const times = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});

/** 1/z; zero for zero, which the callers exclude. Scaled, so that tiny or huge values neither overflow nor vanish. */
export function reciprocal(z: Complex): Complex {
  const scale = Math.max(Math.abs(z.re), Math.abs(z.im));
  if (scale === 0) return { re: 0, im: 0 };
  const [re, im] = [z.re / scale, z.im / scale];
  const squared = (re * re + im * im) * scale;
  return { re: re / squared, im: -im / squared };
}

/** p(z) (Horner). */
export function evaluateAt(p: Polynomial, z: Complex): Complex {
  let value: Complex = { re: 0, im: 0 };
  for (let i = p.length - 1; i >= 0; i--) value = plus(times(value, z), { re: p[i]!, im: 0 });
  return value;
}

/** Principal arctangent: arctan z = (1/2j)·ln((1 + jz)/(1 − jz)), the two logarithms taken apart. */
export function arctangent(z: Complex): Complex {
  const [up, down] = [
    { re: 1 - z.im, im: z.re },
    { re: 1 + z.im, im: -z.re },
  ];
  return {
    re: (Math.atan2(up.im, up.re) - Math.atan2(down.im, down.re)) / 2,
    im: -Math.log(size(up) / size(down)) / 2,
  };
}
