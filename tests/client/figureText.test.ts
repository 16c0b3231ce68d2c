import { describe, expect, it } from "vitest";
import { parseQuantity, resistor } from "#lib/circuit/index.ts";
import { changeText, errorText } from "#lib/wire/changeText.ts";
import { figureText, partText, readFigure, readWindow } from "#lib/wire/figureText.ts";

const r = resistor({ label: "input", symbol: "R", default: 22e3 });

describe("text of a field", () => {
  it("is written as people write it", () => {
    expect(partText(13_700, "Ω")).toBe("13k7");
    expect(partText(10e-9, "F")).toBe("10n");
    expect(partText(0, "Ω")).toBe("none");
    expect(figureText(950, "Hz")).toBe("950");
    expect(figureText(3, "")).toBe("3");
  });

  it("loses no digit", () => {
    for (const value of [21_970.123456789, 1 / 3, 1.1e-12, 123_456_789, 2.2e-7]) {
      for (const text of [partText(value, "Ω"), figureText(value, "Hz"), figureText(value, "")]) {
        expect(parseQuantity(text)).toEqual({ ok: true, value });
      }
    }
  });
});

describe("reading a field", () => {
  it("takes a figure within what can be computed with", () => {
    expect(readFigure("13k7", r)).toEqual({ ok: true, value: 13_700 });
    for (const bad of ["", "0", "-1k", "1e300", "x"]) expect(readFigure(bad, r).ok).toBe(false);
  });

  it("reads a window in per cent", () => {
    expect(readWindow("5")).toEqual({ ok: true, value: 0.05 });
    expect(readWindow("2.5 %")).toEqual({ ok: true, value: 0.025 });
    for (const bad of ["0", "-5", "101", "wide"]) expect(readWindow(bad).ok).toBe(false);
  });
});

describe("what became of a figure", () => {
  it("is told in per cent, or in its own unit where that is logarithmic", () => {
    expect(changeText(1000, 980, "Hz")).toBe("\u22122.0\u00a0%");
    expect(changeText(6, 4.5, "dB")).toBe("\u22121.50\u00a0dB");
    expect(changeText(1000, 1000.001, "Hz")).toBeUndefined();
  });

  it("has a sign unless it is nothing", () => {
    expect(errorText(0.0083)).toBe("+0.83\u00a0%");
    expect(errorText(48e6)).toBe("+999\u00a0% and more");
    expect(errorText(0)).toBe("0\u00a0%");
    expect(errorText(-0.5)).toBe("\u221250\u00a0%");
  });
});
