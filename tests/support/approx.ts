import { expect } from "vitest";

/** Fails unless `actual` lies within `tolerance` of `expected`, relative; both are printed. */
export function expectRelative(actual: unknown, expected: number, tolerance: number, what: string): void {
  if (typeof actual !== "number") return expect.fail(`${what}: expected ${expected}, got ${String(actual)}`);
  const error = expected === 0 ? Math.abs(actual) : Math.abs(actual / expected - 1);
  if (!(error <= tolerance))
    expect.fail(`${what}: expected ${expected} within ${tolerance} relative, got ${actual} (off by ${error})`);
}

/** A value printed with eight significant digits agrees with this one: half a unit of its last digit is allowed. */
export function expectPrinted(actual: unknown, printed: number, what: string, digits = 8): void {
  expectRelative(actual, printed, 0.5000001 * 10 ** (1 - digits), what);
}
