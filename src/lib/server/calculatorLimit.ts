import { settings } from "./env.ts";
import { Refusal } from "./errors.ts";
import { createRateLimit, type RateLimit } from "./rateLimit.ts";

let limit: RateLimit | undefined;

/** What a calculation costs, in analyses. */
export const calculationCosts = { analyse: 1, curves: 5, solve: 50 } as const;

/** Lets a calculation from this address pass, or throws. */
export function countCalculation(address: string, cost: number): void {
  limit ??= createRateLimit({ perMinute: settings().RATE_LIMIT_CALCULATORS, now: () => performance.now() });
  const wait = limit.take(address, cost);
  if (wait === 0) return;
  throw new Refusal("too-many-requests", `Too many calculations came from your address. Go on in ${wait} s.`, {
    headers: { "retry-after": String(wait) },
  });
}
