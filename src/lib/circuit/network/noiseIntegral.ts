import { arctangent, evaluateAt, reciprocal, times } from "./complex.ts";
import { differentiate, rescale, trim } from "./polynomial.ts";
import { findRoots } from "./roots.ts";
import { magnitudeAt, naturalScale, isStable, routhStep, type Transfer } from "./transfer.ts";

/** Where the integral is cut for a response that never falls to zero: far above what can be heard or is used here. */
const cutoff = 1e6;

/**
 * ∫₀^∞ |H(j2πf)|² df in Hz: the noise power that a white density of 1/√Hz leaves after H.
 *
 * For a strictly proper, stable H it is exact, by the recursion on the denominator's coefficients of Åström, Jury and
 * Agniel (IEEE Trans. Autom. Control 15 (1970) 47). A response that levels off (finite op-amp output resistance) has no
 * finite integral; it is then taken up to 1 MHz, in closed form by partial fractions.
 *
 * @throws RangeError where a pole does not lie in the left half plane
 */
export function noiseIntegral(transfer: Transfer): number {
  if (!isStable(transfer)) throw new RangeError("noiseIntegral: the response must be stable");
  const unit = naturalScale(transfer.denominator);
  const a = trim(rescale(transfer.denominator, unit)).reverse();
  const b = trim(rescale(transfer.numerator, unit)).reverse();
  if (b.length >= a.length) return levelledIntegral(transfer, unit) ?? numericIntegral(transfer);
  const padded = [...new Array<number>(a.length - 1 - b.length).fill(0), ...b];
  // The recursion gives ∫|H|² dω/2π over both signs of ω; one sign is half of it.
  return (recursion(a, padded) * unit) / 2;
}

/** I = 1/(2πj) ∫ B(s)B(−s)/(A(s)A(−s)) ds, highest power first, B one degree below A. */
function recursion(a: number[], b: number[]): number {
  let [top, side] = [a, b];
  let integral = 0;
  while (top.length > 1) {
    const alpha = top[0]! / top[1]!;
    const beta = side[0]! / top[1]!;
    integral += (beta * beta) / (2 * alpha);
    [top, side] = [routhStep(top, alpha), routhStep(side, beta, top)];
  }
  return integral;
}

/** Poles nearer than this share of their size make partial fractions cancel; the quadrature takes over. */
const distinct = 1e-3;

/**
 * The integral up to `cutoff` where H tends to a constant H∞. H(s)H(−s) − H∞² = Σ rᵢ·2pᵢ/(s² − pᵢ²) over the poles pᵢ of
 * H with rᵢ = N(pᵢ)/D'(pᵢ)·H(−pᵢ), so that ∫₀^W dω of it is −Σ 2rᵢ·arctan(W/pᵢ).
 *
 * @returns undefined where two poles nearly coincide
 */
function levelledIntegral(transfer: Transfer, unit: number): number | undefined {
  const numerator = rescale(transfer.numerator, unit);
  const denominator = rescale(transfer.denominator, unit);
  const poles = findRoots(denominator);
  const close = poles.some((p, i) =>
    poles.some((q, k) => k < i && Math.hypot(p.re - q.re, p.im - q.im) < distinct * Math.hypot(p.re, p.im)),
  );
  if (close) return undefined;
  const level = trim(numerator).at(-1)! / trim(denominator).at(-1)!;
  const edge = (2 * Math.PI * cutoff) / unit;
  const slope = differentiate(denominator);
  let sum = 0;
  for (const p of poles) {
    const minus = { re: -p.re, im: -p.im };
    const top = times(evaluateAt(numerator, p), evaluateAt(numerator, minus));
    const residue = times(top, reciprocal(times(evaluateAt(slope, p), evaluateAt(denominator, minus))));
    sum += times(residue, arctangent(times({ re: edge, im: 0 }, reciprocal(p)))).re;
  }
  return level * level * cutoff - (sum / Math.PI) * unit;
}

function numericIntegral(transfer: Transfer): number {
  const f = (logFrequency: number) => {
    const frequency = Math.exp(logFrequency);
    return magnitudeAt(transfer, frequency) ** 2 * frequency;
  };
  const [from, to] = [Math.log(1e-3), Math.log(cutoff)];
  // Panels narrow enough that a sharp resonance cannot hide between their nodes.
  const panels = 64;
  let total = 0;
  for (let i = 0; i < panels; i++) {
    const a = from + ((to - from) * i) / panels;
    const b = from + ((to - from) * (i + 1)) / panels;
    total += simpson(f, a, b, f(a), f((a + b) / 2), f(b), 1e-10, 24);
  }
  return total;
}

function simpson(
  f: (x: number) => number,
  a: number,
  b: number,
  fa: number,
  fm: number,
  fb: number,
  tolerance: number,
  depth: number,
): number {
  const m = (a + b) / 2;
  const [fl, fr] = [f((a + m) / 2), f((m + b) / 2)];
  const coarse = ((b - a) / 6) * (fa + 4 * fm + fb);
  const fine = ((b - a) / 12) * (fa + 4 * fl + 2 * fm + 4 * fr + fb);
  if (depth === 0 || Math.abs(fine - coarse) <= 15 * tolerance * Math.abs(fine)) return fine + (fine - coarse) / 15;
  return simpson(f, a, m, fa, fl, fm, tolerance, depth - 1) + simpson(f, m, b, fm, fr, fb, tolerance, depth - 1);
}
