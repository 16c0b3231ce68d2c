export interface RateLimit {
  /** Seconds to wait, or 0 when the request may pass. */
  take(address: string, cost?: number): number;
}

interface Bucket {
  tokens: number;
  at: number;
}

const mostAddresses = 20_000;

/**
 * A bucket of tokens for each address, refilled steadily; a whole minute's worth may be spent at once. Kept in memory: the
 * calculators are pure arithmetic, so what must be bounded is the load on this one process.
 */
export function createRateLimit({ perMinute, now }: { perMinute: number; now: () => number }): RateLimit {
  if (perMinute === 0) return { take: () => 0 };
  const buckets = new Map<string, Bucket>();
  const perMillisecond = perMinute / 60_000;

  return {
    take(address, cost = 1) {
      const at = now();
      const bucket = buckets.get(address);
      const tokens = bucket ? Math.min(perMinute, bucket.tokens + (at - bucket.at) * perMillisecond) : perMinute;
      // Taken out and put back at the end, so that the map stays ordered by last use and the stalest goes first.
      buckets.delete(address);
      // What costs more than a whole minute's worth passes on a full bucket, or it would never pass at all.
      const price = Math.min(cost, perMinute);
      const allowed = tokens >= price;
      buckets.set(address, { tokens: allowed ? tokens - price : tokens, at });
      if (buckets.size > mostAddresses) {
        const [stalest] = buckets.keys();
        if (stalest !== undefined) buckets.delete(stalest);
      }
      return allowed ? 0 : Math.max(1, Math.ceil((price - tokens) / perMillisecond / 1000));
    },
  };
}
