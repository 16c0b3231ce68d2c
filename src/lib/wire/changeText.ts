import { formatQuantity, type Unit } from "#lib/circuit/index.ts";

/** Smaller than anyone can measure on a board; not worth a line. */
const negligible = 5e-5;

/** What became of a figure, in per cent, or in its own unit where that is logarithmic; undefined where nothing did. */
export function changeText(from: number, to: number, unit: Unit): string | undefined {
  if (unit === "dB" || unit === "°" || unit === "semitones") {
    if (Math.abs(to - from) < 0.005) return undefined;
    return signed(to - from, formatQuantity(Math.abs(to - from), unit));
  }
  if (from === 0) return to === 0 ? undefined : formatQuantity(to, unit);
  const share = to / from - 1;
  if (Math.abs(share) < negligible) return undefined;
  return signed(share, percentText(Math.abs(share)));
}

/** A relative error with its sign: +0.83 %. */
export function errorText(share: number): string {
  return Math.abs(share) < negligible ? "0\u00a0%" : signed(share, percentText(Math.abs(share)));
}

function percentText(share: number): string {
  const percent = share * 100;
  // Beyond ten times too much nobody reads digits.
  if (percent > 999) return "999\u00a0% and more";
  return `${percent >= 100 ? percent.toFixed(0) : percent.toPrecision(percent < 0.1 ? 1 : 2)}\u00a0%`;
}

const signed = (value: number, text: string) => `${value < 0 ? "\u2212" : "+"}${text}`;
