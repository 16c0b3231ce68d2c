import { preferredSeries, type SeriesName } from "./preferredSeries.ts";

/**
 * Pot values come in their own steps. The 1–2–5 steps, with 2.2, 2.5 and 4.7 from makers that follow other rows:
 * common practice, no source.
 */
const potSteps = [10, 20, 22, 25, 47, 50] as const;

/** A preferred series, or the steps in which pots are sold. */
export type ValueSeries = SeriesName | "pots";

function mantissas(series: ValueSeries): readonly number[] {
  return series === "pots" ? potSteps : preferredSeries[series];
}

/** Decimal text, so that 4.7 × 10³ is exactly 4700 and 10 × 10⁻⁹ exactly the double nearest to 1e-8. */
function member(mantissa: number, exponent: number): number {
  return Number(`${mantissa}e${exponent}`);
}

/** Every member of the series from `least` to `most` (both positive), ascending. */
export function seriesBetween(series: ValueSeries, least: number, most: number): number[] {
  requirePositive("seriesBetween", least);
  requirePositive("seriesBetween", most);
  const table = mantissas(series);
  const digits = String(table[0]).length - 1;
  const values: number[] = [];
  for (let decade = Math.floor(Math.log10(least)) - 1; decade <= Math.ceil(Math.log10(most)); decade++) {
    for (const mantissa of table) {
      const value = member(mantissa, decade - digits);
      if (value >= least * (1 - 1e-12) && value <= most * (1 + 1e-12)) values.push(value);
    }
  }
  return values;
}

/** The members nearest to `value` by ratio, nearest first. */
export function nearestInSeries(value: number, series: ValueSeries, count = 1): number[] {
  requirePositive("nearestInSeries", value);
  const distance = (candidate: number) => Math.abs(Math.log(candidate / value));
  return seriesBetween(series, value / 30, value * 30)
    .sort((a, b) => distance(a) - distance(b))
    .slice(0, count);
}

/** The next member above (`direction` 1) or below (−1) a value, which need not itself be in the series. */
export function stepAlongSeries(value: number, series: ValueSeries, direction: 1 | -1): number {
  requirePositive("stepAlongSeries", value);
  const around = seriesBetween(series, value / 30, value * 30);
  const beyond = around.filter((candidate) =>
    direction === 1 ? candidate > value * (1 + 1e-9) : candidate < value * (1 - 1e-9),
  );
  return direction === 1 ? beyond[0]! : beyond.at(-1)!;
}

/** Whether a value is a member of the series, to within a part in 10⁹. */
export function isInSeries(value: number, series: ValueSeries): boolean {
  return seriesBetween(series, value * (1 - 1e-9), value * (1 + 1e-9)).length > 0;
}

function requirePositive(who: string, value: number): void {
  if (!(value > 0 && Number.isFinite(value)))
    throw new RangeError(`${who}: a positive finite value is needed, got ${value}`);
}
