import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  defaultParts,
  defaultTargets,
  isInSeries,
  potFraction,
  sensitivities,
  solveStage,
  spacedValues,
  targetWindows,
  type AnyTopology,
  type Solution,
} from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { solveBracketed } from "#lib/circuit/numeric/solveBracketed.ts";
import { boltzmann, elementaryCharge, roomTemperature, thermalVoltage } from "#lib/circuit/device/constants.ts";
import { expectPrinted, expectRelative } from "../support/approx.ts";
import { published, worked } from "../support/published.ts";
import { runs } from "../support/random.ts";

describe("potFraction", () => {
  it.each([0.1, 0.15, 0.2])("passes %d of the track at mid-travel, and the ends at the ends", (m) => {
    expect(potFraction("logarithmic", 0.5, m)).toBeCloseTo(m, 14);
    expect(potFraction("logarithmic", 0, m)).toBe(0);
    expect(potFraction("logarithmic", 1, m)).toBe(1);
    expectPrinted((1 / m - 1) ** 2, worked(`trim.b_${m * 100}`), "base of the law");
  });

  it("gives the worked figures of the 15 % law", () => {
    expectPrinted(potFraction("logarithmic", 0.25) * 100, worked("trim.y25_15"), "trim.y25_15");
    expectPrinted(potFraction("logarithmic", 0.75) * 100, worked("trim.y75_15"), "trim.y75_15");
    expectPrinted(potFraction("reverse-logarithmic", 0.5) * 100, worked("trim.rev50_15"), "trim.rev50_15");
    expectPrinted(20 * Math.log10(potFraction("logarithmic", 0.5)), worked("trim.dB50_15"), "trim.dB50_15");
    expectPrinted(20 * Math.log10(potFraction("linear", 0.5)), worked("trim.dB50_lin"), "trim.dB50_lin");
  });

  it("rises all the way under every law", () => {
    const law = fc.constantFrom("linear", "logarithmic", "reverse-logarithmic");
    const x = fc.integer({ min: 0, max: 999 });
    fc.assert(
      fc.property(law, x, (name, k) => {
        expect(potFraction(name, (k + 1) / 1000)).toBeGreaterThan(potFraction(name, k / 1000));
      }),
      runs(500),
    );
  });

  it.each([-0.01, 1.01, Number.NaN])("throws on a rotation of %d", (x) =>
    expect(() => potFraction("linear", x)).toThrow(RangeError),
  );
});

describe("constants", () => {
  it("give the thermal voltage printed for 300 K and worked for 25 °C", () => {
    const { given, expect: wanted, rel_tol: tolerance } = published("thermal-voltage-300K");
    expectRelative(thermalVoltage(given["temperature"] as number), wanted["thermalVoltage"] as number, tolerance, "VT");
    const room = thermalVoltage(roomTemperature);
    expectPrinted(room * 1e3, worked("const.VT_mV"), "const.VT_mV");
    expectPrinted(1 / (2 * room), worked("const.gm_per_Iabc"), "const.gm_per_Iabc");
    expectPrinted(1e6 / roomTemperature, worked("const.VT_tempco_ppm"), "const.VT_tempco_ppm");
    expectPrinted(Math.sqrt(4 * boltzmann * roomTemperature * 10e3) * 1e9, worked("nz.e10k_nV"), "nz.e10k_nV");
    expectPrinted(Math.sqrt(2 * elementaryCharge * 100e-6) * 1e12, worked("nz.i100uA_pA"), "nz.i100uA_pA");
  });
  it.each([0, -1, Number.NaN])("refuse %d kelvins", (t) => expect(() => thermalVoltage(t)).toThrow(RangeError));
});

describe("solveBracketed", () => {
  it.each([
    ["x³ − 2", (x: number) => x ** 3 - 2, 0, 2, Math.cbrt(2)],
    ["cos x − x", (x: number) => Math.cos(x) - x, 0, 1, 0.7390851332151607],
    ["a step", (x: number) => (x < Math.PI ? -1 : 1), 0, 10, Math.PI],
    ["a flat power", (x: number) => (x - 1) ** 9, 0, 1.7, 1],
    ["ends swapped", (x: number) => x - 0.25, 1, 0, 0.25],
    ["a root at an end", (x: number) => x, 0, 1, 0],
    ["a diode", (v: number) => 1e-14 * Math.expm1(v / 0.0256926) - (5 - v) / 10e3, 0, 5, 0.6248],
  ] as const)("solves %s", (name, f, from, to, root) => {
    const found = solveBracketed(f, from, to);
    if (name === "a diode") expect(Math.abs(f(found))).toBeLessThan(1e-15);
    else expect(found).toBeCloseTo(root, name === "a flat power" ? 1 : 12);
  });

  it("finds the root of every monotonic cubic to full precision, in few steps", () => {
    const root = fc.double({ min: -1e3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(root, fc.double({ min: 1e-6, max: 10, noNaN: true }), (r, bend) => {
        let calls = 0;
        const found = solveBracketed((x) => (calls++, (x - r) * (1 + bend * (x - r) ** 2)), -1.1e3, 1.2e3);
        expect(Math.abs(found - r)).toBeLessThan(1e-10);
        expect(calls).toBeLessThan(70);
      }),
      runs(300),
    );
  });

  it("throws without a change of sign, and on NaN", () => {
    expect(() => solveBracketed((x) => x * x + 1, -1, 1)).toThrow(RangeError);
    expect(() => solveBracketed(() => Number.NaN, 0, 1)).toThrow(RangeError);
  });
});

describe("spacedValues", () => {
  it("spaces by ratio or by difference, both ends exact", () => {
    const axis = { quantity: "", unit: "Hz" } as const;
    expect(spacedValues({ ...axis, scale: "linear" }, [0, 1], 5)).toEqual([0, 0.25, 0.5, 0.75, 1]);
    const log = spacedValues({ ...axis, scale: "logarithmic" }, [10, 1000], 3);
    expect([log[0], log[2]]).toEqual([10, 1000]);
    expect(log[1]).toBeCloseTo(100, 10);
  });
});

const topologies = stageKinds.flatMap((kind) => kind.topologies.filter((t) => Object.keys(t.targets).length > 0));

describe.each(topologies.map((topology) => [topology.id, topology] as const))("solveStage of %s", (_, topology) => {
  const targets = defaultTargets(topology);
  const solve = (t: AnyTopology, request: object = {}): Solution => {
    const solution = solveStage(t, { targets, ...request });
    if ("refused" in solution) throw new Error(solution.message);
    return solution;
  };

  it("ranks candidates by merit, with the errors they really have", () => {
    const { candidates } = solve(topology);
    expect(candidates.length).toBeGreaterThan(0);
    for (const [i, candidate] of candidates.entries()) {
      expect(candidate.merit).toBeGreaterThanOrEqual(candidates[i - 1]?.merit ?? 0);
      for (const [key, error] of Object.entries(candidate.errors))
        expectRelative(candidate.results[topology.targets[key]!.result], targets[key]! * (1 + error), 1e-12, key);
    }
  });

  it.each(["E24", "E96"] as const)("offers only values that exist: %s and E12", (resistor) => {
    for (const { parts } of solve(topology, { series: { resistor, capacitor: "E12" } }).candidates)
      for (const [key, { partClass }] of Object.entries(topology.parts)) {
        if (parts[key] === 0 || partClass === "pot") continue;
        expect(isInSeries(parts[key]!, partClass === "resistor" ? resistor : "E12"), `${key} ${parts[key]}`).toBe(true);
      }
  });

  it("leaves alone what is given", () => {
    const [key, value] =
      Object.entries(defaultParts(topology)).find(([part]) => topology.anchors.some((a) => a.part === part)) ?? [];
    if (key === undefined) return;
    for (const { parts } of solve(topology, { given: { [key]: value } }).candidates) expect(parts[key]).toBe(value);
  });

  it("opens each target's window as wide as asked", () => {
    const [key] = Object.keys(targets) as [string];
    const { least, most, target } = targetWindows(topology, { [key]: 200 }, { [key]: 0.25 })[key]!;
    expect([least, target, most]).toEqual([150, 200, 250]);
  });
});

describe("a solved band-pass", () => {
  const targets = defaultTargets(multipleFeedback);

  it("comes nearer with a finer series", () => {
    const best = (resistor: "E12" | "E96") => {
      const solution = solveStage(multipleFeedback, { targets, series: { resistor } });
      if ("refused" in solution) throw new Error(solution.message);
      return solution.candidates[0]!.merit;
    };
    expect(best("E96")).toBeLessThan(best("E12"));
  });

  it("moves with its parts as the formula says: by the square root of RF and each capacitor", () => {
    const parts = { ra: 22e3, rb: 3200, rbPot: 0, rf: 100e3, c1: 10e-9, c2: 10e-9 };
    const found = sensitivities(multipleFeedback, parts, {}, "centreFrequency");
    for (const key of ["rf", "c1", "c2"]) expectRelative(found[key], -0.5, 1e-7, key);
    expectRelative(found["ra"]! + found["rb"]!, -0.5, 1e-7, "RA and RB together");
    expect(found).not.toHaveProperty("rbPot");
  });
});
