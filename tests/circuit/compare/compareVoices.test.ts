import {
  analyseStages,
  compareVoices,
  defaultParts,
  type DocumentStage,
  type VoiceDocument,
} from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { describe, expect, test } from "vitest";
import { deepFreeze } from "../../support/deepFreeze.ts";
import { bandPassStage } from "../../support/stages.ts";

const stage = (id: string, change: Partial<DocumentStage> = {}): DocumentStage => ({
  ...bandPassStage(id, { ra: "R1", rb: "R2", rf: "R3", c1: "C1", c2: "C2" }),
  ...change,
});

const voice = (...stages: DocumentStage[]): VoiceDocument => ({ stages, links: [], conditions: {} });

const side = (document: VoiceDocument) => deepFreeze({ document, analysis: analyseStages(document, stageKinds) });

/** A stage of a kind with all its usual values. */
function beginOf(kind: string, id: string): DocumentStage {
  const topology = stageKinds.find((one) => one.id === kind)!.topologies[0]!;
  const common = { id, kind, topology: topology.id, name: id, conditions: {}, targets: {}, designators: {} };
  return { ...common, parts: defaultParts(topology) };
}

const compare = (from: VoiceDocument, to: VoiceDocument, ofOneVoice = true) =>
  compareVoices(side(from), side(to), { kinds: stageKinds, ofOneVoice });

const withPart = (part: string, value: number, base = stage("a")): DocumentStage => ({
  ...base,
  parts: { ...base.parts, [part]: value },
});

describe("two equal documents", () => {
  test("have no difference", () => {
    const found = compare(voice(stage("a"), stage("b")), voice(stage("a"), stage("b")));
    expect(found).toMatchObject({
      stages: { added: [], removed: [], changed: [], unchanged: 2 },
      ...{ parts: [], targets: [], conditions: [], results: [], quantities: [], levels: [], curves: [] },
      warnings: { gone: [], new: [] },
      links: { added: [], removed: [] },
    });
  });
});

describe("a changed part", () => {
  const found = compare(voice(stage("a"), stage("b")), voice(withPart("rb", 1800), stage("b")));

  test("is told by its designator, with old, new and the relative change", () => {
    expect(found.parts).toEqual([
      {
        ...{ stage: "a", part: "rb", designator: "R2", partClass: "resistor", unit: "Ω", label: expect.any(String) },
        ...{ from: 2200, to: 1800, change: expect.closeTo(-400 / 2200, 12) },
      },
    ]);
    expect(found.stages.changed).toMatchObject([{ stage: "a", parts: 1, targets: 0 }]);
    expect(found.stages.unchanged).toBe(1);
  });

  test("moves the centre of a multiple-feedback band-pass as √((1/RA + 1/RB)/RF)/C says", () => {
    const centre = (rb: number) => Math.sqrt((1 / 22000 + 1 / rb) / 100000) / (2 * Math.PI * 1e-8);
    const result = found.results.find(({ name }) => name === "centreFrequency");
    expect(result?.from).toBeCloseTo(centre(2200), 6);
    expect(result?.to).toBeCloseTo(centre(1800), 6);
    expect(result?.change).toBeCloseTo(centre(1800) / centre(2200) - 1, 9);
  });

  test("shows in the curve, whose difference in decibels is new less old at every x", () => {
    const [magnitude] = found.curves.filter(({ yAxis }) => yAxis.unit === "dB");
    expect(magnitude?.relative).toBe(false);
    expect(magnitude?.differenceUnit).toBe("dB");
    for (const [i, difference] of magnitude!.difference.entries())
      expect(difference).toBe(magnitude!.to[i]! - magnitude!.from[i]!);
    expect(Math.max(...magnitude!.difference.map(Math.abs))).toBeGreaterThan(1);
  });

  test("changes the parts list by one line each way, and the new value is unique", () => {
    expect(found.quantities).toEqual([
      { partClass: "resistor", value: 1800, unit: "Ω", from: 0, to: 1, newUnique: true },
      { partClass: "resistor", value: 2200, unit: "Ω", from: 2, to: 1, newUnique: false },
    ]);
  });
});

describe("the verdict on a result", () => {
  // f0 of the stage is about 1126 Hz; a window of 5 % around the target decides.
  const wanting = (centreFrequency: number, rb = 2200) =>
    withPart("rb", rb, stage("a", { targets: { centreFrequency }, windows: { centreFrequency: 0.05 } }));
  const verdict = (from: DocumentStage, to: DocumentStage) =>
    compare(voice(from), voice(to)).results.find(({ name }) => name === "centreFrequency");

  test.each([
    ["comes into its window", wanting(1240), wanting(1240, 1800), "better"],
    ["leaves its window", wanting(1126), wanting(1126, 1800), "worse"],
    ["is outside and nearer", wanting(2000), wanting(2000, 1800), "better"],
    ["is outside and farther", wanting(500), wanting(500, 1800), "worse"],
    ["stays well inside", wanting(1126), wanting(1126, 2190), "held"],
    ["has no target", stage("a", { targets: {} }), withPart("rb", 1800, stage("a", { targets: {} })), "no target"],
  ])("that %s is %s", (_, from, to, expected) => {
    expect(verdict(from, to)?.verdict).toBe(expected);
  });

  test("is by the window that now holds, so that moving the target hides nothing", () => {
    const found = verdict(wanting(1126), wanting(1240, 1800));
    expect(found).toMatchObject({ verdict: "better", states: { from: "outside", to: "within" } });
  });
});

describe("stages", () => {
  test("that came and went are listed with their parts", () => {
    const found = compare(voice(stage("a")), voice(stage("b", { name: "Other" })));
    expect(found.stages).toMatchObject({ added: [{ stage: "b" }], removed: [{ stage: "a" }], changed: [] });
    expect(found.parts.filter(({ stage: id }) => id === "b").every(({ from, to }) => from === undefined && to)).toBe(
      true,
    );
    expect(found.parts.filter(({ stage: id }) => id === "a").every(({ from, to }) => from && to === undefined)).toBe(
      true,
    );
  });

  test("of two voices are paired by likeness, each once", () => {
    const found = compare(voice(stage("x"), stage("y")), voice(stage("p", { name: "Band y" }), stage("q")), false);
    expect(found.stages).toMatchObject({ added: [], removed: [] });
    expect(found.stages.changed).toMatchObject([{ stage: "q", nameBefore: "Band x" }]);
  });

  test("that only got another name have changed", () => {
    const found = compare(voice(stage("a")), voice(stage("a", { name: "Body" })));
    expect(found.stages.changed).toMatchObject([{ stage: "a", name: "Body", nameBefore: "Band a", parts: 0 }]);
  });

  test("with a network this library does not know keep their parts out, and do not break the rest", () => {
    const odd = stage("o", { topology: "of-tomorrow" });
    expect(compare(voice(odd, stage("a")), voice(odd, withPart("rb", 1800))).stages.changed).toMatchObject([
      { stage: "a" },
    ]);
  });
});

describe("designators, targets, conditions and links", () => {
  test("a renumbered part is told with both numbers and no change of value", () => {
    const swapped = stage("a", { designators: { ...stage("a").designators, ra: "R2", rb: "R1" } });
    expect(compare(voice(stage("a")), voice(swapped)).parts).toMatchObject([
      { part: "ra", designator: "R2", designatorBefore: "R1", from: 22000, to: 22000 },
      { part: "rb", designator: "R1", designatorBefore: "R2" },
    ]);
  });

  test("a moved target and a wider window are two changes", () => {
    const moved = stage("a", {
      targets: { ...stage("a").targets, qualityFactor: 4 },
      windows: { centreFrequency: 0.2 },
    });
    expect(compare(voice(stage("a")), voice(moved)).targets).toMatchObject([
      { name: "centreFrequencyWindow", to: 0.2 },
      { name: "qualityFactor", from: 3, to: 4, change: expect.closeTo(1 / 3, 12) },
    ]);
  });

  test("a condition left out counts as its usual value", () => {
    const same = compare(voice(stage("a")), voice(stage("a", { conditions: { sourceResistance: 0 } })));
    expect(same.conditions).toEqual([]);
    const loaded = compare(voice(stage("a")), voice(stage("a", { conditions: { sourceResistance: 1000 } })));
    expect(loaded.conditions).toMatchObject([{ name: "sourceResistance", from: 0, to: 1000 }]);
  });

  test("a link is known by its ends, not by its id", () => {
    const link = (id: string, to: string) => ({ id, from: { stage: "a", port: "out" }, to: { stage: to, port: "in" } });
    const from = { ...voice(stage("a"), stage("b")), links: [link("1", "b")] };
    expect(compare(from, { ...from, links: [link("2", "b")] }).links).toEqual({ added: [], removed: [] });
    expect(compare(from, { ...from, links: [] }).links.removed).toHaveLength(1);
  });
});

test("sixty stages, all changed, are compared in well under a second", () => {
  const many = (rb: number) => voice(...Array.from({ length: 60 }, (_, i) => withPart("rb", rb, stage(`s${i}`))));
  const [from, to] = [side(many(2200)), side(many(1800))];
  // Processor time: what else the machine does meanwhile is not the comparison's.
  const began = process.cpuUsage();
  const found = compareVoices(from, to, { kinds: stageKinds });
  const { user, system } = process.cpuUsage(began);
  expect(found.stages.changed).toHaveLength(60);
  expect(found.curves.length).toBeGreaterThanOrEqual(60);
  expect((user + system) / 1000).toBeLessThan(1000);
});

test("a stage nobody touched shows what its neighbour's change did to it", () => {
  const passive = stage("a", {
    topology: "passive",
    targets: {},
    parts: { c1: 33e-9, r1: 4700, r2: 47_000, c2: 3.3e-9 },
  });
  const loadedBy = (next: DocumentStage): VoiceDocument => ({
    ...voice(passive, next),
    links: [{ id: "1", from: { stage: "a", port: "out" }, to: { stage: "b", port: "in" } }],
  });
  const found = compare(loadedBy(stage("b")), loadedBy(withPart("ra", 10_000, stage("b"))));
  const untouched = found.stages.changed.find(({ stage: id }) => id === "a");
  expect(untouched).toMatchObject({ parts: 0, targets: 0, conditions: 0 });
  expect(untouched?.results).toBeGreaterThan(0);
  expect(found.conditions).toContainEqual(expect.objectContaining({ stage: "a", byNeighbour: true }));
});

describe("levels and supply", () => {
  const source: DocumentStage = beginOf("noise-source", "noise");
  const chain = (band: DocumentStage): VoiceDocument => ({
    ...voice(source, band),
    links: [{ id: "1", from: { stage: "noise", port: "out" }, to: { stage: "a", port: "in" } }],
  });

  test("a band-pass with more gain lifts its own point of the chain and no other", () => {
    const found = compare(chain(stage("a")), chain(withPart("rf", 200_000)));
    const own = found.levels.filter(({ stage: id }) => id === "a");
    expect(own.length).toBeGreaterThan(0);
    for (const { from, to } of own) expect(to!.rms).not.toBe(from!.rms);
  });

  test("a stage with its own op amps more draws more from both rails", () => {
    const found = compare(voice(stage("a")), voice(stage("a"), stage("b"), stage("c")));
    expect(found.supply!.positive.to).toBeGreaterThan(found.supply!.positive.from);
    expect(found.supply!.positive.windowLow).toBeLessThan(found.supply!.positive.from);
    expect(found.supply!.positive.windowHigh).toBeGreaterThan(found.supply!.positive.from);
  });

  test("a side kept without them says nothing of them", () => {
    const { document, analysis } = side(voice(stage("a")));
    const { supply: _, ...bare } = analysis;
    const early = { document, analysis: { ...bare, levels: [] } };
    expect(compareVoices(early, side(voice(stage("a"))), { kinds: stageKinds }).supply).toBeUndefined();
  });
});
