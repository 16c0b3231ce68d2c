import { availableParallelism } from "node:os";
import { join } from "node:path";
import type { Calculation, CalculationAnswer, CalculationRequest } from "#lib/circuit/analysis/calculations.ts";
import { settings } from "../env.ts";
import { createPool, type Pool } from "./pool.ts";

/** What a thread is told. */
export interface CalculationTask<C extends Calculation = Calculation> {
  calculation: C;
  kind: string;
  topology: string;
  request: CalculationRequest<C>;
}

/** Figures of the most boards and curves there may be lie outside the heap and stay below 120 MiB. */
const heapOfThread = 256;

let pool: Pool | undefined;

/** Calculates on a thread of the pool, or refuses where too much is under way. */
export function calculateApart<C extends Calculation>(
  task: CalculationTask<C>,
  signal?: AbortSignal,
): Promise<CalculationAnswer<C>> {
  pool ??= open();
  return pool.run(task, signal) as Promise<CalculationAnswer<C>>;
}

function open(): Pool {
  const { CALCULATION_WORKERS, CALCULATION_QUEUE, CALCULATION_SECONDS, OUT_DIR } = settings();
  // In development the sources run as they are, through the loader that the server itself was started with.
  const file = import.meta.env.DEV ? join("src", "run", "calculate.ts") : join(OUT_DIR, "run", "calculate.mjs");
  return createPool(join(process.cwd(), file), {
    workers: CALCULATION_WORKERS || Math.max(1, availableParallelism() - 1),
    queue: CALCULATION_QUEUE,
    seconds: CALCULATION_SECONDS,
    memory: heapOfThread,
  });
}
