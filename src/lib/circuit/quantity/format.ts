import { prefixes } from "./prefixes.ts";
import { units, type Unit } from "./units.ts";

export interface Printed {
  /** The digits, with a real minus sign where negative: "951.6". */
  figure: string;
  /** Prefix and unit, to be set in a lighter ink: "kHz"; empty for a plain ratio. */
  unit: string;
}

const minus = (text: string) => text.replace("-", "\u2212");

/**
 * Prints a quantity in engineering notation with four significant figures (decibels, degrees and the like with two
 * decimals at most).
 *
 * @param value in the plain SI unit; must be finite
 * @param digits significant figures, 1 to 6
 */
export function printQuantity(value: number, unit: Unit, digits = 4): Printed {
  if (!Number.isFinite(value)) throw new RangeError(`printQuantity: value must be finite, got ${value}`);
  if (!units[unit].prefixed) return { figure: minus(plainFigure(value, unit, digits)), unit };
  const { mantissa, prefix } = engineering(value, digits);
  return { figure: minus(mantissa), unit: prefix + unit };
}

/** {@link printQuantity} as one string: "951.6 Hz". */
export function formatQuantity(value: number, unit: Unit, digits = 4): string {
  const printed = printQuantity(value, unit, digits);
  if (printed.unit === "") return printed.figure;
  return printed.unit === "°" ? printed.figure + printed.unit : `${printed.figure}\u00a0${printed.unit}`;
}

/**
 * A component value as it is written on a schematic, the prefix standing for the decimal point: 4700 → "4k7",
 * 1e-8 → "10n", 4.7 → "4R7" (IEC 60062 style). Digits beyond the fifth are dropped.
 */
export function formatPartValue(value: number, unit: Unit = "Ω"): string {
  if (value === 0) return "0";
  const { mantissa, prefix } = engineering(value, 5);
  const [whole, decimals = ""] = mantissa.split(".");
  const rest = decimals.replace(/0+$/, "");
  if (rest === "") return whole + prefix;
  if (prefix !== "") return whole + prefix + rest;
  return unit === "Ω" ? `${whole}R${rest}` : `${whole}.${rest}`;
}

/** A value as typed into a field, decimal point kept and trailing zeros dropped: 21970 → "21.97k", 0.5 → "0.5". */
export function formatTyped(value: number, unit: Unit, digits = 6): string {
  if (value === 0) return "0";
  if (!units[unit].prefixed)
    return trimZeros(value.toPrecision(digits).includes("e") ? String(value) : value.toPrecision(digits));
  const { mantissa, prefix } = engineering(value, digits);
  return trimZeros(mantissa) + prefix;
}

function trimZeros(text: string): string {
  return text.includes(".") ? text.replace(/\.?0+$/, "") : text;
}

function engineering(value: number, digits: number): { mantissa: string; prefix: string } {
  if (value === 0) return { mantissa: "0", prefix: "" };
  // Round first: 999.96 with four figures is 1.000 k, not 1000.
  const rounded = Number(value.toPrecision(digits));
  const decade = Math.floor(Math.log10(Math.abs(rounded)) + 1e-12);
  const exponent = Math.min(9, Math.max(-15, Math.floor(decade / 3) * 3));
  const decimals = Math.max(0, Math.min(20, digits - 1 - (decade - exponent)));
  const mantissa = (rounded / 10 ** exponent).toFixed(decimals);
  return { mantissa, prefix: prefixes.find((p) => p.exponent === exponent)!.symbol };
}

function plainFigure(value: number, unit: Unit, digits: number): string {
  if (unit === "dB" || unit === "°" || unit === "semitones" || unit === "cents/°" || unit === "K")
    return value.toFixed(2).replace(/^-(0\.00)$/, "$1");
  if (value === 0) return "0";
  const size = Math.abs(value);
  if (unit === "%") return percentFigure(value, size, digits);
  if (size >= 1e6 || size < 1e-4)
    return value
      .toExponential(digits - 1)
      .replace(/e([+-])(\d+)/, (_, sign, power) => ` × 10${superscript(`${sign === "-" ? "-" : ""}${power}`)}`);
  return value.toPrecision(digits).includes("e") ? value.toFixed(0) : value.toPrecision(digits);
}

/** Below a millionth of the whole nobody can tell the figures apart. */
function percentFigure(value: number, size: number, digits: number): string {
  if (size < 1e-4) return value < 0 ? "> -0.0001" : "< 0.0001";
  if (size >= 1e6) return value.toExponential(2).replace(/e\+(\d+)/, (_, power) => ` × 10${superscript(power)}`);
  return Number(value.toPrecision(Math.min(digits, size < 1 ? 2 : 3))).toString();
}

const raised: Record<string, string> = {
  "-": "⁻",
  0: "⁰",
  1: "¹",
  2: "²",
  3: "³",
  4: "⁴",
  5: "⁵",
  6: "⁶",
  7: "⁷",
  8: "⁸",
  9: "⁹",
};
const superscript = (text: string) => [...text].map((c) => raised[c] ?? c).join("");
