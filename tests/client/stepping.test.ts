import { describe, expect, it } from "vitest";
import { condition, pot, resistor, target } from "#lib/circuit/index.ts";
import { stepFigure, stepPart } from "#lib/client/stage/stepping.ts";

const r = resistor({ label: "input", symbol: "R", default: 22e3 });
const rv = pot({ label: "pot", symbol: "R_V", default: 0, most: 100e3 });
const f = target({
  label: "Centre",
  symbol: "f",
  unit: "Hz",
  default: 1000,
  least: 20,
  most: 12e3,
  window: 0.05,
  result: "centre",
});
const rail = condition({ label: "Rail", symbol: "V", unit: "V", default: 12, least: 5, most: 18, scale: "linear" });

describe("stepping a part", () => {
  it("goes along its series from wherever it stands", () => {
    expect(stepPart(22e3, r, "E24", 1)).toBe(24e3);
    expect(stepPart(22e3, r, "E24", -1)).toBe(20e3);
    expect(stepPart(22.5e3, r, "E12", -1)).toBe(22e3);
    expect(stepPart(22e3, r, "E12", 1, 10)).toBe(150e3);
  });

  it("stops at what can be computed with", () => {
    const top = stepPart(9e9, r, "E12", 1, 50);
    expect(top).toBeLessThanOrEqual(10e9);
    expect(stepPart(top, r, "E12", 1)).toBe(top);
  });

  it("fits a pot that was left out, and leaves it out again", () => {
    const fitted = stepPart(0, rv, "pots", 1);
    expect(fitted).toBeGreaterThan(0);
    expect(stepPart(fitted, rv, "pots", -1)).toBe(0);
    expect(stepPart(0, rv, "pots", -1)).toBe(0);
    expect(stepPart(1000, rv, "pots", 1)).toBe(2000);
  });
});

describe("stepping a figure", () => {
  it("moves the second digit", () => {
    expect(stepFigure(950, f, 1)).toBe(960);
    expect(stepFigure(1000, f, 1)).toBe(1100);
    expect(stepFigure(1000, f, -1)).toBe(990);
    expect(stepFigure(3, f, 1, 10)).toBe(4);
  });

  it("moves even steps where the scale is even", () => {
    expect(stepFigure(12, rail, 1)).toBeCloseTo(12.2);
    expect(stepFigure(12, rail, -1, 10)).toBeCloseTo(10);
  });
});
