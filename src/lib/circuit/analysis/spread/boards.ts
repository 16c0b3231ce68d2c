import { uniformAt } from "../../numeric/counterRandom.ts";
import { normalQuantile } from "../../numeric/normalQuantile.ts";
import type { PlainValues } from "../../stage/defaults.ts";
import { setParts, type Factor } from "./factors.ts";
import { referenceTemperature, type BoardsRequest } from "./request.ts";

/** Above any that parts take, two each. */
const temperatureStream = 0xffffffff;

/**
 * The random boards of a seed. Board number n is the same whatever was asked for before it: draw n of stream 2p is the
 * error of the part at place p (of the first of its lot), of stream 2p + 1 its drift, of the last stream the temperature.
 *
 * @returns sets the varied parts of board n in `values` and gives its temperature, K
 */
export function boardsOf(request: BoardsRequest, factors: readonly Factor[]) {
  const { seed, temperature } = request;
  const unit = request.distribution === "uniform" ? (u: number) => 2 * u - 1 : (u: number) => normalQuantile(u) / 3;
  return (board: number, values: PlainValues): number => {
    const kelvin = temperature
      ? temperature.least + (temperature.most - temperature.least) * uniformAt(seed, board, temperatureStream)
      : referenceTemperature;
    for (const factor of factors) {
      const off = unit(uniformAt(seed, board, 2 * factor.place));
      const lean = temperature ? 2 * uniformAt(seed, board, 2 * factor.place + 1) - 1 : 0;
      setParts(values, factor, off, lean, kelvin);
    }
    return kelvin;
  };
}
