import {
  acceptedRange,
  formatPartValue,
  formatTyped,
  parseQuantity,
  type NumberField,
  type Unit,
} from "#lib/circuit/index.ts";
import { rangeFault } from "./rangeFault.ts";

const reads = (text: string, unit: Unit, value: number) => {
  const parsed = parseQuantity(text, unit);
  return parsed.ok && parsed.value === value;
};

/** What stands in the field of a part that is not fitted, and in place of its value everywhere else. */
export const notFitted = "none";

/** A component value as it stands in its field: 4k7. Never rounded: reading it gives the value again. */
export function partText(value: number, unit: Unit): string {
  if (value === 0) return notFitted;
  const marked = formatPartValue(value, unit);
  return reads(marked, unit, value) ? marked : figureText(value, unit);
}

/** A figure as it stands in its field: 950, 13.7k. Never rounded. */
export function figureText(value: number, unit: Unit): string {
  for (const digits of [6, 9, 12]) {
    const typed = formatTyped(value, unit, digits);
    if (reads(typed, unit, value)) return typed;
  }
  return String(value);
}

export type Reading = { ok: true; value: number } | { ok: false; message: string };

/** What was typed into a field, or why it cannot be computed with. */
export function readFigure(text: string, field: NumberField): Reading {
  if ("partClass" in field && text.trim().toLowerCase() === notFitted) text = "0";
  const parsed = parseQuantity(text, field.unit);
  if (!parsed.ok) return { ok: false, message: parsed.reason };
  const [least, most] = acceptedRange(field);
  const fault = rangeFault(field, parsed.value, least, most);
  return fault === undefined ? { ok: true, value: parsed.value } : { ok: false, message: fault };
}

const widest = 100;

/** A window's half-width as typed, in per cent; the value is relative. */
export function readWindow(text: string): Reading {
  const parsed = parseQuantity(text.replace(/%\s*$/, ""));
  if (parsed.ok && parsed.value > 0 && parsed.value <= widest) return { ok: true, value: parsed.value / 100 };
  return { ok: false, message: `Type a window in per cent, more than 0 and at most ${widest}.` };
}

export const windowText = (width: number) => String(Number((width * 100).toPrecision(6)));
