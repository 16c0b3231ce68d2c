import type { PlainValues } from "../../stage/defaults.ts";
import type { Bench } from "./bench.ts";
import { figureOf } from "./bench.ts";
import { unitDeviation, type Factor } from "./factors.ts";
import { referenceTemperature, type BoardsRequest } from "./request.ts";

/** Step of ln(part): the error of the central difference is of its square, about 10⁻⁸, and rounding of 10⁻¹². */
const step = 1e-4;
const kelvinStep = 0.05;

/** How results move: by part, d result / d ln part; and per kelvin of the devices. */
export interface Slopes {
  parts: Record<string, PlainValues>;
  perKelvin: PlainValues;
}

/** Slopes of every result at the nominal board, by central differences of the exact analysis. */
export function slopesOf(bench: Bench, names: readonly string[], request: BoardsRequest): Slopes {
  const at = (temperature: number) => {
    const results = bench.measure(temperature);
    return (name: string) => figureOf(results, name);
  };
  const slopes: Slopes = { parts: {}, perKelvin: {} };
  const middle = request.temperature
    ? (request.temperature.least + request.temperature.most) / 2
    : referenceTemperature;
  bench.clear();
  for (const [part, nominal] of Object.entries(request.parts)) {
    if (nominal === 0) continue;
    bench.parts[part] = nominal * Math.exp(step);
    const above = at(middle);
    bench.parts[part] = nominal * Math.exp(-step);
    const below = at(middle);
    bench.parts[part] = nominal;
    slopes.parts[part] = byName(names, (name) => (above(name) - below(name)) / (2 * step));
  }
  if (request.temperature) {
    const [above, below] = [at(middle + kelvinStep), at(middle - kelvinStep)];
    slopes.perKelvin = byName(names, (name) => (above(name) - below(name)) / (2 * kelvinStep));
  }
  return slopes;
}

/** d ln result / d ln part, by result and part; none for a result of zero. */
export function relativeSlopes(slopes: Slopes, nominal: PlainValues): Record<string, PlainValues> {
  const relative: Record<string, PlainValues> = {};
  for (const [name, value] of Object.entries(nominal)) {
    if (value === 0) continue;
    const own = Object.entries(slopes.parts)
      .filter(([, by]) => name in by)
      .map(([part, by]): [string, number] => [part, by[name]! / value]);
    if (own.length > 0) relative[name] = Object.fromEntries(own);
  }
  return relative;
}

/**
 * Standard deviation of each result to first order: the root of the sum of squares of slope times deviation. Parts of a
 * lot add up before they are squared, and so does all that follows the boards' common temperature.
 */
export function rootSumSquare(
  slopes: Slopes,
  factors: readonly Factor[],
  request: BoardsRequest,
  names: readonly string[],
): PlainValues {
  const unit = unitDeviation[request.distribution];
  const { temperature = { least: referenceTemperature, most: referenceTemperature } } = request;
  const variance = (temperature.most - temperature.least) ** 2 / 12;
  const offset = (temperature.most + temperature.least) / 2 - referenceTemperature;
  return byName(names, (name) => {
    let sum = 0;
    let perKelvin = slopes.perKelvin[name] ?? 0;
    for (const { parts } of factors) {
      let [tolerance, lean] = [0, 0];
      for (const varied of parts) {
        const slope = slopes.parts[varied.part]?.[name] ?? Number.NaN;
        tolerance += slope * varied.tolerance;
        lean += (slope * (varied.drift.most - varied.drift.least)) / 2;
        perKelvin += (slope * (varied.drift.most + varied.drift.least)) / 2;
      }
      sum += (tolerance * unit) ** 2 + (lean ** 2 / 3) * (variance + offset ** 2);
    }
    return Math.sqrt(sum + perKelvin ** 2 * variance);
  });
}

function byName(names: readonly string[], of: (name: string) => number): PlainValues {
  return Object.fromEntries(names.map((name) => [name, of(name)]).filter(([, value]) => Number.isFinite(value)));
}
