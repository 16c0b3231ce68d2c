export interface RateLimit {
  /** Seconds to wait, or 0 when the request may pass. */
  take(address: string): number;
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
    take(address) {
      const at = now();
      const bucket = buckets.get(address);
      const tokens = bucket ? Math.min(perMinute, bucket.tokens + (at - bucket.at) * perMillisecond) : perMinute;
      // Taken out and put back at the end, so that the map stays ordered by last use and the stalest goes first.
      buckets.delete(address);
      const allowed = tokens >= 1;
      buckets.set(address, { tokens: allowed ? tokens - 1 : tokens, at });
      if (buckets.size > mostAddresses) {
        const [stalest] = buckets.keys();
        if (stalest !== undefined) buckets.delete(stalest);
      }
      return allowed ? 0 : Math.max(1, Math.ceil((1 - tokens) / perMillisecond / 1000));
    },
  };
}
