import { settings } from "./env.ts";
import { Refusal } from "./errors.ts";
import { createRateLimit, type RateLimit } from "./rateLimit.ts";

let limit: RateLimit | undefined;

/** Lets a calculation from this address pass, or throws. */
export function countCalculation(address: string): void {
  limit ??= createRateLimit({ perMinute: settings().RATE_LIMIT_CALCULATORS, now: () => performance.now() });
  const wait = limit.take(address);
  if (wait === 0) return;
  throw new Refusal("too-many-requests", `Too many calculations came from your address. Go on in ${wait} s.`, {
    headers: { "retry-after": String(wait) },
  });
}
