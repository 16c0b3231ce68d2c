import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { add, differentiate, evaluate, multiply, squaredMagnitude } from "#lib/circuit/network/polynomial.ts";
import { noiseIntegral } from "#lib/circuit/network/noiseIntegral.ts";
import { readResonance } from "#lib/circuit/network/resonance.ts";
import {
  isStable,
  magnitudeAt,
  magnitudeDbAt,
  phaseDegrees,
  positiveRoots,
  type Transfer,
} from "#lib/circuit/network/transfer.ts";
import { expectRelative } from "../support/approx.ts";
import { published } from "../support/published.ts";
import { logarithmic, runs } from "../support/random.ts";

const lowPass = (order: number, corner: number): Transfer => ({
  numerator: [1],
  denominator: multiply(...new Array<number[]>(order).fill([1, 1 / (2 * Math.PI * corner)])),
});

function butterworth(order: number, corner: number): Transfer {
  const w = 2 * Math.PI * corner;
  const pairs = Array.from({ length: Math.floor(order / 2) }, (_, k) => [
    1,
    (2 * Math.sin((Math.PI * (2 * k + 1)) / (2 * order))) / w,
    1 / w ** 2,
  ]);
  return { numerator: [1], denominator: multiply(...pairs, ...(order % 2 ? [[1, 1 / w]] : [])) };
}

const bandPass = (centre: number, quality: number, gain: number): Transfer => {
  const w = 2 * Math.PI * centre;
  return { numerator: [0, (-gain * w) / quality], denominator: [w * w, w / quality, 1] };
};

/** ∫|H|² df by the trapezium rule in ln f, which converges faster than any power for such functions. */
function trapezium(transfer: Transfer, middle: number): number {
  const [step, decades] = [1 / 400, 12];
  let sum = 0;
  for (let k = -decades / step; k <= decades / step; k++) {
    const f = middle * 10 ** (k * step);
    sum += magnitudeAt(transfer, f) ** 2 * f;
  }
  return sum * step * Math.LN10;
}

/** −3 dB frequency of a low-pass, by halving. */
function corner(transfer: Transfer): number {
  let [low, high] = [1e-3, 1e9];
  for (let i = 0; i < 200; i++) {
    const middle = Math.sqrt(low * high);
    if (magnitudeAt(transfer, middle) ** 2 > 0.5) low = middle;
    else high = middle;
  }
  return low;
}

describe("polynomials", () => {
  const p = fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: 1, maxLength: 5 });
  it("multiply, add and differentiate as their values do", () => {
    fc.assert(
      fc.property(p, p, fc.double({ min: -2, max: 2, noNaN: true }), (a, b, x) => {
        expect(evaluate(multiply(a, b), x)).toBeCloseTo(evaluate(a, x) * evaluate(b, x), 6);
        expect(evaluate(add(a, b), x)).toBeCloseTo(evaluate(a, x) + evaluate(b, x), 10);
        const h = 1e-5;
        expect(evaluate(differentiate(a), x)).toBeCloseTo((evaluate(a, x + h) - evaluate(a, x - h)) / (2 * h), 4);
      }),
      runs(300),
    );
  });

  it("give |p(jω)|² in x = ω²", () => {
    fc.assert(
      fc.property(p, fc.double({ min: 0, max: 3, noNaN: true }), (a, omega) => {
        const size = magnitudeAt({ numerator: a, denominator: [1] }, omega / (2 * Math.PI));
        expect(evaluate(squaredMagnitude(a), omega * omega)).toBeCloseTo(size * size, 6);
      }),
      runs(300),
    );
  });
});

describe("noiseIntegral", () => {
  const orders = [1, 2, 3, 4, 5];
  const factor = (transfer: Transfer) => noiseIntegral(transfer) / corner(transfer);

  it.each([
    ["nb-01", lowPass],
    ["nb-02", butterworth],
  ] as const)("gives the published ratios of noise to −3 dB bandwidth, case %s", (id, filter) => {
    const { given, expect: wanted, rel_tol: tolerance, source } = published(id);
    expect(given["orders"]).toEqual(orders);
    for (const [i, order] of orders.entries())
      expectRelative(
        factor(filter(order, 1000)),
        (wanted["factor"] as number[])[i]!,
        tolerance,
        `${source.title}, order ${order}`,
      );
  });

  it("is exact where a closed form exists", () => {
    expectRelative(noiseIntegral(lowPass(1, 20e3)), (Math.PI / 2) * 20e3, 1e-14, "one pole: π/2 · fc");
    expectRelative(noiseIntegral(lowPass(2, 1e3)), (Math.PI / 4) * 1e3, 1e-14, "two equal poles: π/4 · f0");
    for (const order of orders) {
      const exact = (1000 * (Math.PI / (2 * order))) / Math.sin(Math.PI / (2 * order));
      expectRelative(noiseIntegral(butterworth(order, 1000)), exact, 1e-13, `Butterworth of order ${order}`);
    }
    fc.assert(
      fc.property(logarithmic(1, 1e6), logarithmic(0.1, 1e3), logarithmic(0.01, 100), (centre, quality, gain) =>
        expectRelative(
          noiseIntegral(bandPass(centre, quality, gain)),
          (gain ** 2 * (Math.PI / 2) * centre) / quality,
          1e-12,
          "band-pass: H0² · π/2 · f0/Q",
        ),
      ),
      runs(300),
    );
  });

  it("equals a numeric integral for higher orders", () => {
    const w = logarithmic(100, 1e5);
    fc.assert(
      fc.property(w, w, w, fc.double({ min: 0.05, max: 0.9, noNaN: true }), (a, b, c, damping) => {
        const transfer = {
          numerator: multiply([0.3, 1 / a], [1, 2 / b]),
          denominator: multiply([1, (2 * damping) / a, 1 / a ** 2], [1, 1 / b], [1, 1 / c]),
        };
        expectRelative(noiseIntegral(transfer), trapezium(transfer, a / (2 * Math.PI)), 1e-9, "noise integral");
      }),
      runs(20),
    );
  });

  it("is taken up to 1 MHz where the response levels off", () => {
    const floor = 1e-3;
    const transfer = { numerator: [1, floor / (2 * Math.PI * 1e3)], denominator: [1, 1 / (2 * Math.PI * 1e3)] };
    // |H|² = (1 + floor² u²)/(1 + u²) with u = f/f0: the closed form of the integral to 1 MHz.
    const exact = 1e3 * ((1 - floor ** 2) * Math.atan(1e3) + floor ** 2 * 1e3);
    expectRelative(noiseIntegral(transfer), exact, 1e-6, "levelled response");
  });

  it("throws on an unstable response", () =>
    expect(() => noiseIntegral({ numerator: [1], denominator: [1, -1] })).toThrow(RangeError));
});

describe("readResonance", () => {
  it("reads an ideal band-pass exactly, whatever its centre, Q and gain", () => {
    fc.assert(
      fc.property(logarithmic(1, 1e5), logarithmic(0.1, 1e3), logarithmic(0.01, 100), (centre, quality, gain) => {
        const found = readResonance(bandPass(centre, quality, gain))!;
        expectRelative(found.centreFrequency, centre, 1e-12, "centre");
        expectRelative(found.peakGain, gain, 1e-12, "gain");
        expectRelative(found.bandwidth, centre / quality, 1e-9, "bandwidth");
        expectRelative(found.lowerEdge * found.upperEdge, centre ** 2, 1e-11, "edges about the centre");
        expectRelative(found.noiseBandwidth, ((Math.PI / 2) * centre) / quality, 1e-11, "noise bandwidth");
      }),
      runs(300),
    );
  });

  it("has nothing to read off a low-pass", () => expect(readResonance(lowPass(2, 1000))).toBeUndefined());
});

describe("phaseDegrees", () => {
  it("starts and ends where the order says, without a jump between", () => {
    for (const [transfer, first, last] of [
      [lowPass(3, 1000), 0, -270],
      [bandPass(1000, 20, 2), -90, -270],
      [{ numerator: [-1, 0.1], denominator: multiply([1, 1], [1, 0.01]) }, -180, -450],
    ] as const) {
      const phase = phaseDegrees(transfer);
      expect(phase(1e-9)).toBeCloseTo(first, 3);
      expect(phase(1e12)).toBeCloseTo(last, 3);
      const points = Array.from({ length: 20001 }, (_, k) => phase(1e-6 * 10 ** (k / 1250)));
      expect(Math.max(...points.slice(1).map((y, i) => Math.abs(y - points[i]!)))).toBeLessThan(20);
    }
  });

  it("does not leap by a turn when a far zero appears in the right half plane", () => {
    const plain = { numerator: [0, -1], denominator: [1, 0.1, 1] };
    const far = { numerator: [0, -1, 0, 1e-12], denominator: [1, 0.1, 1] };
    expect(phaseDegrees(far)(0.1)).toBeCloseTo(phaseDegrees(plain)(0.1), 4);
  });
});

describe("transfer functions", () => {
  it("print −3 dB at the corner", () => expect(magnitudeDbAt(lowPass(1, 50), 50)).toBeCloseTo(-3.0103, 4));
  it("tell stable from unstable", () => {
    expect(isStable({ numerator: [1], denominator: [1, 0.1, 1] })).toBe(true);
    expect(isStable({ numerator: [1], denominator: [1, -0.1, 1] })).toBe(false);
    expect(isStable({ numerator: [1], denominator: [1, 0, 1] })).toBe(false);
  });
  it("know the positive roots of a polynomial, ascending", () => {
    const found = positiveRoots(multiply([-1e-6, 1], [-1, 1], [2, 1], [-1e6, 1], [1, 0.1, 1]));
    expect(found.length).toBe(3);
    for (const [i, root] of [1e-6, 1, 1e6].entries()) expectRelative(found[i], root, 1e-13, "root");
  });
});
