import {
  byPackage,
  byValue,
  computeChain,
  designate,
  designatorFaults,
  partsList,
  shareHints,
} from "#lib/circuit/voice/index.ts";
import { describe, expect, test } from "vitest";
import { find, stageOf, twoPaths } from "../../support/chains.ts";

const band = (id: string, own: Parameters<typeof stageOf>[3] = {}) =>
  stageOf(id, "band-pass", "multiple-feedback", {
    ...own,
    parts: { ra: 22e3, rb: 2200, rbPot: 0, rf: 100e3, c1: 10e-9, c2: 10e-9, ...own.parts },
  });

describe("the parts of a voice", () => {
  test("stand with value, tolerance, type, stage and quantity, and boards multiply", () => {
    const list = partsList([band("a", { designators: { ra: "R1" } })], find, 25);
    expect(list.parts.map(({ part }) => part)).toEqual(["ra", "rb", "rf", "c1", "c2"]);
    expect(list.parts[0]).toEqual({
      designator: "R1",
      stage: "a",
      stageName: "a",
      part: "ra",
      label: find("band-pass", "multiple-feedback")!.topology.parts.ra!.label,
      partClass: "resistor",
      value: 22e3,
      unit: "Ω",
      tolerance: 0.01,
      type: "film resistor",
      fitted: true,
      quantity: 25,
    });
    expect(list.devices).toMatchObject([{ part: "u1", letter: "U", quantity: 25, perPackage: 2 }]);
  });

  test("that are marked not fitted stay in sight and are not counted", () => {
    const list = partsList(
      [band("a", { designators: { rbPot: "RV1" } }), { ...band("b"), notFitted: ["c2", "u1"] }],
      find,
    );
    expect(list.parts.filter(({ fitted }) => !fitted).map(({ stage, part }) => `${stage}.${part}`)).toEqual([
      "a.rbPot",
      "b.c2",
    ]);
    expect(byValue(list.parts).find(({ unit }) => unit === "F")).toMatchObject({ quantity: 3 });
    expect(byPackage(list)).toMatchObject([{ quantity: 1, spare: 1 }]);
  });

  test("of a network that this version does not know are said to be missing", () => {
    expect(partsList([{ ...band("a"), kind: "unheard-of" }], find).unknown).toEqual(["a"]);
  });

  test("take the type that the stage's conditions choose", () => {
    const stage = band("a", { conditions: { dielectric: "class-2", potLaw: "logarithmic" }, parts: { rbPot: 2e3 } });
    const types = new Set(partsList([stage], find).parts.map(({ type }) => type));
    expect([...types]).toEqual(["film resistor", "logarithmic pot", "class 2 ceramic capacitor"]);
  });

  test("group by value, type and tolerance, resistors first, by rising value", () => {
    const groups = byValue(
      partsList([band("a"), band("b", { parts: { ra: 22e3 + 1e-10, rb: 2700 } })], find, 10).parts,
    );
    expect(groups.map(({ value, quantity }) => [Number(value.toPrecision(6)), quantity])).toEqual([
      [2200, 10],
      [2700, 10],
      [22e3, 20],
      [100e3, 20],
      [10e-9, 40],
    ]);
  });

  test("pack devices as tightly as they go, around those that have a package", () => {
    const marked = band("a", { designators: { u1: "U3A" } });
    expect(byPackage(partsList([marked, band("b"), band("c")], find, 2))).toEqual([
      { type: "JFET-input op amp, two in a package", quantity: 4, spare: 2, designators: ["U3A"] },
    ]);
  });
});

describe("designators on request", () => {
  test("fill what has none with the next free number, and leave the others alone", () => {
    const stages = [band("a", { designators: { rf: "R2", u1: "U1A" } }), band("b", { designators: { c1: "C7" } })];
    const [a, b] = designate(stages, find);
    expect(a!.designators).toEqual({ rf: "R2", u1: "U1A", ra: "R1", rb: "R3", c1: "C1", c2: "C2" });
    expect(b!.designators).toEqual({ c1: "C7", ra: "R4", rb: "R5", rf: "R6", c2: "C3", u1: "U1B" });
  });

  test("given to all are given once", () => {
    const stages = designate(twoPaths().stages, find);
    expect(designatorFaults(stages, find)).toEqual({ duplicates: [], gaps: [], missing: [] });
    expect(designate(stages, find)).toEqual(stages);
  });

  test("begin at one again when renumbered, in the order of the stages", () => {
    const stages = designate([...twoPaths().stages].reverse(), find);
    const [first] = designate([...stages].reverse(), find, { renumber: true });
    expect(first!.designators.ra).toBe("R1");
    const all = designate([...stages].reverse(), find, { renumber: true });
    expect(designatorFaults(all, find)).toEqual({ duplicates: [], gaps: [], missing: [] });
  });

  test("show what is wrong: twice, left out, missing", () => {
    const stages = [
      band("a", { designators: { ra: "R1", rb: "R5", rf: "R7" } }),
      band("b", { designators: { ra: "R1" } }),
    ];
    const faults = designatorFaults(stages, find);
    expect(faults.duplicates).toEqual([
      {
        designator: "R1",
        places: [
          { stage: "a", part: "ra" },
          { stage: "b", part: "ra" },
        ],
      },
    ]);
    expect(faults.gaps).toEqual(["R2–R4", "R6"]);
    expect(faults.missing).toContainEqual({ stage: "b", part: "u1" });
  });
});

test("a value used once is pointed out, with one in use that keeps the targets, and never one that does not", () => {
  const targets = { centreFrequency: 950, qualityFactor: 3, peakGain: 2.27 };
  const stages = [
    { ...band("a", { parts: { rb: 3200 } }), targets },
    { ...band("b", { parts: { rb: 3300, rf: 105e3 } }), targets },
    { ...band("c", { parts: { rb: 3300 } }), targets },
  ];
  const hints = shareHints(partsList(stages, find), computeChain({ stages, links: [], conditions: {} }, find));
  expect(hints.map(({ part, instead }) => [`${part.stage}.${part.part}`, instead?.value])).toEqual([
    ["a.rb", 3300],
    ["b.rf", 100e3],
  ]);
  const strict = stages.map((stage) => ({
    ...stage,
    windows: { centreFrequency: 0.002, qualityFactor: 0.02, peakGain: 0.02 },
  }));
  const tight = shareHints(partsList(strict, find), computeChain({ stages: strict, links: [], conditions: {} }, find));
  expect(tight.find(({ part }) => part.stage === "a")!.instead).toBe(undefined);
});
