import { prefixExponent } from "./prefixes.ts";
import { units, type Unit } from "./units.ts";

export type Parsed = { ok: true; value: number } | { ok: false; reason: string };

const number = /^([+-]?)(\d+\.?\d*|\.\d+)(?:[eE]([+-]?\d{1,4}))?$/;
const prefixed = /^([+-]?)(\d+\.?\d*|\.\d+)\s*([a-zA-Zµμ])$/;
const infix = /^([+-]?)(\d*)([a-zA-ZµμΩ])(\d+)$/;

const unitSpellings: Record<string, Unit> = { ohm: "Ω", ohms: "Ω", "\u2126": "Ω", R: "Ω" };

/**
 * Reads a quantity the way people write it: `4700`, `4.7k`, `4k7`, `100n`, `0.1u`, `2M2`, `R47`, `10 kΩ`, `1e3`.
 * The letter may stand in for the decimal point, as in the resistance and capacitance codes of IEC 60062.
 *
 * @param text what was typed; at most 40 characters
 * @param unit the unit that may follow the figure (`10 kHz` in a field of hertz); left out, only bare figures are read
 * @returns the value in the plain SI unit, or the reason why it cannot be read, worded for the person who typed it
 */
export function parseQuantity(text: string, unit: Unit = ""): Parsed {
  const trimmed = text.trim().replace(/\u2212/g, "-");
  if (trimmed === "") return refuse("Type a value, such as 4k7, 100n or 1.5.");
  if (trimmed.length > 40) return refuse("This is too long for a value. Type a figure such as 4k7, 100n or 1.5.");
  if (trimmed.includes(",")) return refuse("Use a point for decimals: 4.7k or 4k7. A comma can be read in two ways.");
  const bare = stripUnit(trimmed, unit);
  const exponent = scaleOf(bare, unit === "" || unit === "Ω");
  if (exponent === undefined) return refuse(`“${trimmed}” is not a value. Type a figure such as 4k7, 100n or 1.5.`);
  const value = Number(exponent);
  return Number.isFinite(value) ? { ok: true, value } : refuse(`“${trimmed}” is too large for any value.`);
}

/** Letters that mark ohms where no prefix stands: 4R7, 470R. */
const ohmMarks = new Set(["R", "Ω"]);

/** Decimal text of the figure: built as text so that 4k7 becomes exactly the double nearest to 4700, not 4.7 × 1000. */
function scaleOf(text: string, mayBeOhms: boolean): string | undefined {
  const powerOf = (letter: string) => (mayBeOhms && ohmMarks.has(letter) ? 0 : prefixExponent(letter));
  const plain = number.exec(text);
  if (plain) return `${plain[1]}${plain[2]}e${plain[3] ?? "0"}`;
  const suffixed = prefixed.exec(text);
  if (suffixed) {
    const power = powerOf(suffixed[3]!);
    return power === undefined ? undefined : `${suffixed[1]}${suffixed[2]}e${power}`;
  }
  const inside = infix.exec(text);
  if (inside) {
    const power = powerOf(inside[3]!);
    return power === undefined ? undefined : `${inside[1]}${inside[2] || "0"}.${inside[4]}e${power}`;
  }
  return undefined;
}

function stripUnit(text: string, unit: Unit): string {
  if (unit === "") return text.replace(/\s*[×x]$/, "");
  for (const [spelling, meant] of Object.entries(unitSpellings)) {
    if (meant === unit && text.endsWith(spelling) && /\d|\s|[a-zA-Zµμ]/.test(text.at(-spelling.length - 1) ?? "")) {
      return text.slice(0, -spelling.length).trimEnd();
    }
  }
  if (!text.endsWith(unit)) return text;
  const rest = text.slice(0, -unit.length);
  // In a field of metres "5m" is five milli-, not five metres: only a spelt-out prefix or a space makes the letter a unit.
  const collides = units[unit].prefixed && prefixExponent(unit) !== undefined && /\d$/.test(rest);
  return collides ? text : rest.trimEnd();
}

function refuse(reason: string): Parsed {
  return { ok: false, reason };
}
