import {
  acceptedRange,
  stepAlongSeries,
  type NumberField,
  type PartClass,
  type PartField,
  type ValueSeries,
} from "#lib/circuit/index.ts";

/** Below this a part that need not be fitted steps down to "not fitted". */
const smallest = { pot: 100, resistor: 100, capacitor: 1e-12 } as const satisfies Record<PartClass, number>;

/** A part moved `count` steps along its series, kept within what can be computed with. */
export function stepPart(value: number, field: PartField, series: ValueSeries, direction: 1 | -1, count = 1): number {
  const [least, most] = acceptedRange(field);
  let stepped = value;
  for (let i = 0; i < count; i++) {
    if (field.default === 0 && direction === -1 && stepped <= smallest[field.partClass]) return 0;
    const next =
      stepped === 0
        ? direction === 1
          ? (field.suggestion ?? smallest[field.partClass])
          : 0
        : stepAlongSeries(stepped, series, direction);
    if (next < least || next > most) return stepped;
    stepped = next;
  }
  return stepped;
}

/**
 * A figure moved by `count` units of its second significant digit (950 → 960, 3 → 3.1), or by hundredths of the usual
 * range where the scale is linear.
 */
export function stepFigure(value: number, field: NumberField, direction: 1 | -1, count = 1): number {
  const [least, most] = acceptedRange(field);
  let stepped = value;
  for (let i = 0; i < count; i++) {
    const unit = field.scale === "linear" ? linearUnit(field) : digitUnit(stepped, field, direction);
    const next = Number(((Math.round(stepped / unit) + direction) * unit).toPrecision(9));
    if (next < least || next > most) return stepped;
    stepped = next;
  }
  return stepped;
}

function digitUnit(value: number, field: NumberField, direction: 1 | -1): number {
  if (!(value > 0)) return 10 ** Math.floor(Math.log10(field.suggestion ?? field.most) - 1);
  const decade = 10 ** Math.floor(Math.log10(value) + 1e-9);
  // Downwards from a whole power of ten the next finer digit counts: 1000 → 990, not 900.
  return direction === -1 && value <= decade * (1 + 1e-9) ? decade / 100 : decade / 10;
}

function linearUnit(field: NumberField): number {
  const rough = (field.most - field.least) / 100;
  const decade = 10 ** Math.floor(Math.log10(rough));
  return [1, 2, 5, 10].map((m) => m * decade).find((step) => step >= rough * (1 - 1e-9))!;
}
