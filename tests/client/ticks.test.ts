import { describe, expect, it } from "vitest";
import { linearTicks, logarithmicTicks } from "../../src/components/plot/ticks.ts";

describe("ticks of a logarithmic axis", () => {
  it("stand on 1-2-5 steps", () => {
    expect(logarithmicTicks(100, 10_000, 12)).toEqual([100, 200, 500, 1000, 2000, 5000, 10_000]);
  });

  it("are exact far below one", () => {
    expect(logarithmicTicks(1e-9, 1e-8, 12)).toEqual([1e-9, 2e-9, 5e-9, 1e-8]);
  });

  it("become fewer where there is less room", () => {
    expect(logarithmicTicks(100, 10_000, 5)).toEqual([100, 300, 1000, 3000, 10_000]);
    expect(logarithmicTicks(100, 10_000, 3)).toEqual([100, 1000, 10_000]);
    expect(logarithmicTicks(1, 1e12, 5).length).toBeLessThanOrEqual(5);
  });

  it("stay within the stretch", () => {
    for (const tick of logarithmicTicks(37, 880, 12)) {
      expect(tick).toBeGreaterThanOrEqual(37);
      expect(tick).toBeLessThanOrEqual(880);
    }
    expect(logarithmicTicks(37, 880, 12)).toEqual([50, 100, 200, 500]);
  });
});

describe("ticks of a linear axis", () => {
  it("widen the stretch to whole steps", () => {
    expect(linearTicks(-38.2, 7.1, 6)).toEqual({ domain: [-40, 10], ticks: [-40, -30, -20, -10, 0, 10] });
  });

  it("keep an exact stretch as it is", () => {
    expect(linearTicks(0.3, 9.7, 5, { exact: true })).toEqual({ domain: [0.3, 9.7], ticks: [5] });
  });

  it("divide a turn as people do", () => {
    expect(linearTicks(0, 270, 4, { angle: true, exact: true }).ticks).toEqual([0, 90, 180, 270]);
    expect(linearTicks(-270, -90, 5, { angle: true }).ticks).toEqual([-270, -225, -180, -135, -90]);
  });

  it("have no rounding dust", () => {
    expect(linearTicks(0, 0.4, 5).ticks).toEqual([0, 0.1, 0.2, 0.3, 0.4]);
    expect(linearTicks(-0.1, 0.1, 3).ticks.some((tick) => Object.is(tick, -0))).toBe(false);
  });

  it("draw a flat line with room about it", () => {
    const { domain } = linearTicks(950, 950, 5);
    expect(domain[0]).toBeLessThan(950);
    expect(domain[1]).toBeGreaterThan(950);
  });
});
