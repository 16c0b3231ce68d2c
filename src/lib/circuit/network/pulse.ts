import { evaluateAt, plus, reciprocal, size, times, type Complex } from "./complex.ts";
import { differentiate, rescale, trim } from "./polynomial.ts";
import { findRoots } from "./roots.ts";
import { naturalScale, type Transfer } from "./transfer.ts";

/** A pole in rad/s and the residue of H there, in rad/s: the impulse response is Σ residue·e^(pole·t). */
export interface Mode {
  pole: Complex;
  residue: Complex;
}

/** Poles nearer than this share of their size make the residues cancel. */
const distinct = 1e-6;

/**
 * Partial fractions of a response that falls to zero at high frequency.
 *
 * @returns undefined where two poles coincide, or nearly
 */
export function modesOf(transfer: Transfer): Mode[] | undefined {
  const unit = naturalScale(transfer.denominator.slice(0, 3));
  const numerator = trim(rescale(transfer.numerator, unit));
  const denominator = trim(rescale(transfer.denominator, unit));
  const slope = differentiate(denominator);
  const poles = findRoots(denominator);
  const close = poles.some((p, i) =>
    poles.some((q, k) => k < i && Math.hypot(p.re - q.re, p.im - q.im) < distinct * size(p)),
  );
  if (close) return undefined;
  return poles.map((p) => {
    const residue = times(evaluateAt(numerator, p), reciprocal(evaluateAt(slope, p)));
    return { pole: scaled(p, unit), residue: scaled(residue, unit) };
  });
}

const scaled = ({ re, im }: Complex, by: number): Complex => ({ re: re * by, im: im * by });

/** Response at a time to a step of 1 at time 0: Σ (residue/pole)·(e^(pole·t) − 1). */
export function stepResponse(modes: readonly Mode[], time: number): number {
  if (time <= 0) return 0;
  return sumOf(modes, ({ pole, residue }) => {
    const grown = exponential(pole, time);
    return times(times(residue, reciprocal(pole)), { re: grown.re - 1, im: grown.im });
  });
}

/** Response at a time to an impulse of area 1 at time 0, which is the slope of the response to a step. */
export function impulseResponse(modes: readonly Mode[], time: number): number {
  return time < 0 ? 0 : sumOf(modes, ({ pole, residue }) => times(residue, exponential(pole, time)));
}

function exponential({ re, im }: Complex, time: number): Complex {
  const grown = Math.exp(re * time);
  return { re: grown * Math.cos(im * time), im: grown * Math.sin(im * time) };
}

const sumOf = (modes: readonly Mode[], term: (mode: Mode) => Complex): number =>
  modes.reduce<Complex>((total, mode) => plus(total, term(mode)), { re: 0, im: 0 }).re;
