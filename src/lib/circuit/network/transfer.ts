import { evaluate, multiply, rescale, squaredMagnitude, type Polynomial } from "./polynomial.ts";
import type { Complex } from "./complex.ts";
import { findRoots } from "./roots.ts";

/** A transfer function H(s) = numerator/denominator with real coefficients, constant term first. */
export interface Transfer {
  numerator: Polynomial;
  denominator: Polynomial;
}

/** |H(j2πf)|, a plain ratio. `frequency` in Hz, not negative. */
export function magnitudeAt({ numerator, denominator }: Transfer, frequency: number): number {
  const omega = 2 * Math.PI * frequency;
  return sizeAt(numerator, omega) / sizeAt(denominator, omega);
}

/** H1·H2·… of networks that do not load one another. */
export function cascade(...stages: readonly Transfer[]): Transfer {
  return {
    numerator: multiply(...stages.map(({ numerator }) => numerator)),
    denominator: multiply(...stages.map(({ denominator }) => denominator)),
  };
}

/** |H| in decibels. */
export function magnitudeDbAt(transfer: Transfer, frequency: number): number {
  return 20 * Math.log10(magnitudeAt(transfer, frequency));
}

/** |p(jω)| by its even and odd parts, each a Horner scheme in −ω². */
function sizeAt(p: Polynomial, omega: number): number {
  const x = -omega * omega;
  let even = 0;
  let odd = 0;
  for (let i = p.length - 1; i >= 0; i--) {
    if (i % 2 === 0) even = even * x + p[i]!;
    else odd = odd * x + p[i]!;
  }
  return Math.hypot(even, odd * omega);
}

/** The poles, in rad/s. */
export function polesOf({ denominator }: Transfer): Complex[] {
  return findRoots(denominator);
}

/** The finite zeros, in rad/s. */
export function zerosOf({ numerator }: Transfer): Complex[] {
  return findRoots(numerator);
}

/** The geometric mean of the roots' sizes, or 1 where there is none: the frequency about which coefficients balance. */
export function naturalScale(p: Polynomial): number {
  let last = p.length - 1;
  while (last > 0 && p[last] === 0) last--;
  let first = 0;
  while (first < last && p[first] === 0) first++;
  return last > first ? Math.abs(p[first]! / p[last]!) ** (1 / (last - first)) : 1;
}

/**
 * True where every pole has a negative real part: the network settles instead of oscillating. By the Routh criterion on
 * the scaled denominator, so no root is computed.
 */
export function isStable({ denominator }: Transfer): boolean {
  const scale = naturalScale(denominator);
  let order = denominator.length - 1;
  while (order > 0 && denominator[order] === 0) order--;
  const sign = denominator[order]! < 0 ? -1 : 1;
  // The table's rows, highest power first, each written over the one before: a step drops its first coefficient.
  const row: number[] = [];
  for (let i = order; i >= 0; i--) row.push(sign * denominator[i]! * scale ** i);
  for (let k = 0; k < order; k++) {
    if (!(row[k]! > 0 && row[k + 1]! > 0)) return false;
    const share = row[k]! / row[k + 1]!;
    for (let i = k + 2; i < order; i += 2) row[i]! -= share * row[i + 1]!;
  }
  return row[order]! > 0;
}

/** One reduction of the Routh table, highest power first: every second coefficient loses `share` of the next one. */
export function routhStep(row: readonly number[], share: number, by: readonly number[] = row): number[] {
  return row.slice(1).map((c, i) => (i % 2 === 1 ? c - share * (by[i + 2] ?? 0) : c));
}

/**
 * Phase of H in degrees as a continuous function of frequency, counted from its low-frequency end: a negative gain there
 * is −180°, and each zero at the origin adds 90°. Each other pole and zero contributes the angle that (jω − root) has
 * turned since, which never jumps, so no unwrapping is needed.
 */
export function phaseDegrees(transfer: Transfer): (frequency: number) => number {
  const zeros = zerosOf(transfer);
  const poles = polesOf(transfer);
  const lowest = (p: Polynomial) => p.find((c) => c !== 0) ?? 0;
  const sign = Math.sign(lowest(transfer.numerator)) * Math.sign(lowest(transfer.denominator)) < 0 ? -180 : 0;
  // A root in the right half plane turns the other way.
  const angle = (omega: number, { re, im }: Complex) =>
    ((re > 0 ? Math.atan2(im - omega, re) : Math.atan2(omega - im, -re)) * 180) / Math.PI;
  return (frequency) => {
    const omega = 2 * Math.PI * frequency;
    const sum = (roots: Complex[]) => roots.reduce((total, root) => total + angle(omega, root), 0);
    return sign + sum(zeros) - sum(poles);
  };
}

/** N(x) and D(x) with |H|² = N/D in x = (ω/unit)², `unit` in rad/s. */
export function powerGain({ numerator, denominator }: Transfer, unit: number): { top: number[]; bottom: number[] } {
  return { top: squaredMagnitude(rescale(numerator, unit)), bottom: squaredMagnitude(rescale(denominator, unit)) };
}

/** Positive real roots of a polynomial, ascending. */
export function positiveRoots(p: Polynomial): number[] {
  return findRoots(p)
    .filter(({ re, im }) => re > 0 && re < Infinity && Math.abs(im) <= 1e-6 * re)
    .map(({ re }) => polish(p, re))
    .sort((a, b) => a - b);
}

/** Newton steps on the real line, kept only while they bring the residual down. */
function polish(p: Polynomial, start: number): number {
  let x = start;
  let residual = Math.abs(evaluate(p, x));
  for (let i = 0; i < 4; i++) {
    const slope = p.reduce((s, c, k) => (k === 0 ? s : s + k * c * x ** (k - 1)), 0);
    const next = x - evaluate(p, x) / slope;
    const nextResidual = Math.abs(evaluate(p, next));
    if (!(next > 0) || !(nextResidual < residual)) break;
    [x, residual] = [next, nextResidual];
  }
  return x;
}
