import { createRateLimit } from "#lib/server/rateLimit.ts";
import { describe, expect, test } from "vitest";

function limitOf(perMinute: number) {
  let time = 0;
  const limit = createRateLimit({ perMinute, now: () => time });
  /** The waits that were asked for. */
  const spend = (count: number, address = "a") =>
    Array.from({ length: count }, () => limit.take(address)).filter((wait) => wait > 0);
  return { spend, pass: (milliseconds: number) => (time += milliseconds) };
}

describe("the limit on calculations", () => {
  test("lets a minute's worth through at once and says how long to wait for more", () => {
    const { spend } = limitOf(60);
    expect(spend(60)).toEqual([]);
    expect(spend(1)).toEqual([1]);
  });

  test("refills steadily", () => {
    const { spend, pass } = limitOf(60);
    spend(60);
    pass(10_000);
    expect(spend(11)).toHaveLength(1);
  });

  test("counts each address by itself", () => {
    const { spend } = limitOf(5);
    expect(spend(6, "a")).toHaveLength(1);
    expect(spend(5, "b")).toEqual([]);
  });

  test("takes what a calculation costs, and never more than a full minute's worth", () => {
    let time = 0;
    const limit = createRateLimit({ perMinute: 60, now: () => time });
    expect(limit.take("a", 50)).toBe(0);
    expect(limit.take("a", 50)).toBe(40);
    time = 60_000;
    expect(limit.take("a", 500)).toBe(0);
  });

  test("told 0, lets everything through", () => {
    expect(limitOf(0).spend(20_001)).toEqual([]);
  });

  test("names the wait in whole seconds when the refill is slow", () => {
    const { spend } = limitOf(2);
    spend(2);
    expect(spend(1)).toEqual([30]);
  });
});
