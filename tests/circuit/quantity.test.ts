import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  formatPartValue,
  formatQuantity,
  formatTyped,
  parseMarking,
  parseQuantity,
  printQuantity,
  units,
  type Unit,
} from "#lib/circuit/index.ts";
import { logarithmic, runs } from "../support/random.ts";
import { published } from "../support/published.ts";

const parsed = (text: string, unit?: Unit) => {
  const outcome = parseQuantity(text, unit);
  return outcome.ok ? outcome.value : outcome.reason;
};

describe("parseQuantity", () => {
  it.each(["mk-01", "mk-02"])("reads the marking codes of IEC 60062, case %s", (id) => {
    const { given, expect: wanted, source } = published(id);
    expect(source.title).toContain("IEC 60062");
    expect((given["codes"] as string[]).map((code) => parsed(code))).toEqual(wanted["values"]);
  });

  it.each([
    ["4700", 4700],
    ["4.7k", 4700],
    ["4k7", 4700],
    ["4K7", 4700],
    ["  4.7 k ", 4700],
    ["13k7", 13700],
    [".5", 0.5],
    ["1e3", 1000],
    ["1E-9", 1e-9],
    ["-12", -12],
    ["\u221212", -12],
    ["+3", 3],
    ["100n", 100e-9],
    ["0.1u", 0.1e-6],
    ["0.1\u00b5", 0.1e-6],
    ["0.1\u03bc", 0.1e-6],
    ["2M2", 2.2e6],
    ["2m2", 2.2e-3],
    ["p33", 0.33e-12],
    ["3G3", 3.3e9],
  ])("reads %j as %d", (text, value) => expect(parsed(text)).toBe(value));

  it.each([
    ["10 kHz", "Hz", 10e3],
    ["10kHz", "Hz", 10e3],
    ["10k", "Hz", 10e3],
    ["4k7Ω", "Ω", 4700],
    ["4.7 kΩ", "Ω", 4700],
    ["4.7 k\u2126", "Ω", 4700],
    ["470 ohms", "Ω", 470],
    ["470R", "Ω", 470],
    ["10nF", "F", 10e-9],
    ["5 m", "m", 5],
    ["5m", "m", 5e-3],
    ["5mm", "m", 5e-3],
    ["20 ms", "s", 20e-3],
    ["3×", "", 3],
    ["6 dB", "dB", 6],
  ] as const)("reads %j in a field of %s", (text, unit, value) => expect(parsed(text, unit)).toBe(value));

  it.each([
    "",
    " ",
    "abc",
    "k",
    "4k7k",
    "4..7",
    "4.7.1",
    "4,7k",
    "1 000",
    "1/2",
    "0x10",
    "NaN",
    "Infinity",
    "-",
    "e3",
    "1e400",
    "1e",
    "4 k 7",
    "10 kHz",
    "10q",
    "1".repeat(41),
  ])("refuses %j with a sentence for the person who typed it", (text) => {
    const outcome = parseQuantity(text);
    expect(outcome.ok).toBe(false);
    expect(outcome.ok ? "" : outcome.reason).toMatch(/^[A-Z“].+\.$/);
  });

  it("refuses a unit that is not the field's", () => {
    expect(parseQuantity("10 kHz", "Ω").ok).toBe(false);
    expect(parseQuantity("10 nF", "Hz").ok).toBe(false);
    expect(parseQuantity("470R", "Hz").ok).toBe(false);
    expect(parseQuantity("4R7", "F").ok).toBe(false);
  });

  it("never answers with anything but a finite number or a reason", () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom(..."0123456789.,-+eEkKmMunµpRΩ ∞xN"), maxLength: 12 }), (text) => {
        const outcome = parseQuantity(text);
        expect(outcome.ok ? Number.isFinite(outcome.value) : outcome.reason.length > 0).toBe(true);
      }),
      runs(3000),
    );
  });
});

describe("parseMarking", () => {
  it("reads the tolerance letters of IEC 60062, case mk-03", () => {
    const { given, expect: wanted } = published("mk-03");
    const read = (given["codes"] as string[]).map((code) => parseMarking(code));
    expect(read.map((marking) => marking?.tolerance)).toEqual(wanted["tolerance"]);
    expect(read.map((marking) => marking?.value)).toEqual(read.map(() => 4700));
  });

  it.each([
    ["4M7M", 4.7e6, 0.2],
    ["47K", 47e3, undefined],
    ["47KK", 47e3, 0.1],
    ["R47J", 0.47, 0.05],
    ["n33M", 0.33e-9, 0.2],
  ])("reads %s: only a letter after the whole value is a tolerance", (text, value, tolerance) =>
    expect(parseMarking(text)).toEqual({ value, tolerance }),
  );

  it.each(["4K7Q", "J", "", "4K7JJ"])("does not read %j", (text) => expect(parseMarking(text)).toBeUndefined());
});

describe("formatQuantity", () => {
  it.each([
    [951.6, "Hz", "951.6\u00a0Hz"],
    [999.96, "Hz", "1.000\u00a0kHz"],
    [999.94, "Hz", "999.9\u00a0Hz"],
    [13700, "Ω", "13.70\u00a0kΩ"],
    [1e-8, "F", "10.00\u00a0nF"],
    [4.7e-16, "F", "0.4700\u00a0fF"],
    [2.2e10, "Ω", "22.00\u00a0GΩ"],
    [0, "V", "0\u00a0V"],
    [-12, "V", "\u221212.00\u00a0V"],
    [3, "", "3.000"],
    [7.1309, "dB", "7.13\u00a0dB"],
    [-0.001, "dB", "0.00\u00a0dB"],
    [137.4, "°", "137.40°"],
    [1.5e7, "", "1.500 × 10⁷"],
    [-2.5e-7, "", "\u22122.500 × 10⁻⁷"],
  ] as const)("prints %d %s", (value, unit, text) => expect(formatQuantity(value, unit)).toBe(text));

  it("does not print what is not finite", () => {
    expect(() => printQuantity(Number.NaN, "Hz")).toThrow(RangeError);
    expect(() => printQuantity(Infinity, "Hz")).toThrow(RangeError);
  });

  it("keeps four significant figures of every size", () => {
    const spelt = (text: string) => text.replace("\u2212", "-").replace("\u00a0", " ").replace("µ", "u");
    fc.assert(
      fc.property(logarithmic(1e-14, 9e11), (value) => {
        const back = parseQuantity(spelt(formatQuantity(value, "Hz")), "Hz");
        expect(back.ok && Math.abs(back.value / value - 1)).toBeLessThanOrEqual(5.01e-4);
      }),
      runs(1000),
    );
  });
});

describe("formatPartValue and formatTyped", () => {
  it.each([
    [4700, "Ω", "4k7"],
    [47000, "Ω", "47k"],
    [4.7, "Ω", "4R7"],
    [0.47, "Ω", "470m"],
    [2.2e6, "Ω", "2M2"],
    [13700, "Ω", "13k7"],
    [470, "Ω", "470"],
    [1e-8, "F", "10n"],
    [4.7e-9, "F", "4n7"],
    [1e-6, "F", "1µ"],
    [0, "Ω", "0"],
  ] as const)("writes %d %s as %s", (value, unit, text) => expect(formatPartValue(value, unit)).toBe(text));

  it("writes values that read back as the same number", () => {
    const mantissa = fc.integer({ min: 10000, max: 99999 });
    fc.assert(
      fc.property(mantissa, fc.integer({ min: -16, max: 4 }), (digits, power) => {
        const value = Number(`${digits}e${power}`);
        for (const unit of ["Ω", "F"] as const) {
          expect(parsed(formatPartValue(value, unit))).toBe(value);
          expect(parsed(formatTyped(value, unit), unit)).toBe(value);
        }
      }),
      runs(1000),
    );
  });

  it.each([
    [21970, "Ω", "21.97k"],
    [0.5, "", "0.5"],
    [100, "", "100"],
    [1000, "Hz", "1k"],
    [1e-15, "", "1e-15"],
    [0, "Hz", "0"],
  ] as const)("writes %d %s into a field as %s", (value, unit, text) => expect(formatTyped(value, unit)).toBe(text));

  it("has a spoken name for every unit but the plain ratio", () => {
    for (const [unit, { spoken }] of Object.entries(units)) expect(spoken === "", unit).toBe(unit === "");
  });
});
