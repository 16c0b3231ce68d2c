import {
  analyseStages,
  compareVoices,
  reviewChecklist,
  type DocumentStage,
  type Reviewed,
} from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { describe, expect, test } from "vitest";
import { bandPassStage } from "../../support/stages.ts";

const base: DocumentStage = bandPassStage("a", { ra: "R1", rb: "R2", rf: "R3", c1: "C1", c2: "C2" });
const withParts = (parts: Record<string, number>): DocumentStage => ({ ...base, parts: { ...base.parts, ...parts } });

function check(from: readonly DocumentStage[], to: readonly DocumentStage[], change: Partial<Reviewed> = {}) {
  const side = (stages: readonly DocumentStage[]) => {
    const document = { stages, links: [], conditions: {} };
    return { document, analysis: analyseStages(document, stageKinds) };
  };
  const newer = side(to);
  const items = reviewChecklist({
    comparison: compareVoices(side(from), newer, { kinds: stageKinds }),
    reason: "darker band",
    warnings: newer.analysis.warnings.map((warning) => ({ ...warning, accepted: false })),
    stageNames: { a: "Band a" },
    openThreads: 0,
    ...change,
  });
  return Object.fromEntries(items.map((item) => [item.id, item]));
}

describe("the checklist of a review", () => {
  test("says of every changed value that it has the reason of the revision", () => {
    expect(check([base], [withParts({ rb: 1800 })]).reason).toMatchObject({
      state: "checked",
      details: ["1 changed, all for: “darker band”"],
    });
  });

  test("opens where a result left its window", () => {
    const target = (stage: DocumentStage) => ({ ...stage, targets: { centreFrequency: 1126 } });
    const found = check([target(base)], [target(withParts({ rb: 1200 }))]);
    expect(found.results?.state).toBe("open");
    expect(found.results?.details[0]).toMatch(/^Band a: Centre frequency is now 1\.\d+\skHz, outside$/);
    expect(check([target(base)], [target(base)]).results?.state).toBe("checked");
  });

  test("opens where a stage nobody touched lost its window", () => {
    const target = { ...base, targets: { centreFrequency: 1126 } };
    const document = { stages: [target], links: [], conditions: {} };
    const analysis = analyseStages(document, stageKinds);
    const moved = { ...analysis, results: { a: { ...analysis.results.a, centreFrequency: 2000 } } };
    const comparison = compareVoices({ document, analysis }, { document, analysis: moved }, { kinds: stageKinds });
    const items = reviewChecklist({ comparison, reason: "", warnings: [], stageNames: {}, openThreads: 0 });
    expect(items.find(({ id }) => id === "elsewhere")).toMatchObject({ state: "open" });
    expect(check([base], [withParts({ rb: 1800 })]).elsewhere?.state).toBe("checked");
  });

  test("names a value that is used once, and one that left the ordinary series", () => {
    const found = check([base], [withParts({ rb: 2210 })]);
    expect(found.unique).toMatchObject({ state: "look", details: ["2k21, resistor, is used once"] });
    expect(found.series).toMatchObject({ state: "look", details: ["R2: 2k21 is not in E24"] });
    const back = check([withParts({ rb: 2210 })], [base]);
    expect(back.series?.state).toBe("checked");
  });

  test("asks to look where designators were swapped", () => {
    const swapped = { ...base, designators: { ...base.designators, ra: "R2", rb: "R1" } };
    expect(check([base], [swapped]).nets).toMatchObject({
      state: "look",
      details: ["R1 is now R2", "R2 is now R1"],
    });
  });

  test("opens at a fault nobody accepted, and closes once it is accepted", () => {
    const warning = {
      stage: "a",
      code: "x",
      severity: "fault",
      value: 1,
      limit: 0,
      message: "Clips.",
      unit: "V",
    } as const;
    const found = (accepted: boolean) => check([base], [base], { warnings: [{ ...warning, accepted }] }).warnings;
    expect(found(false)).toMatchObject({ state: "open", details: ["Band a: Clips."] });
    expect(found(true)).toMatchObject({ state: "checked", details: ["Band a, accepted: Clips."] });
  });

  test("opens while a question is not resolved", () => {
    expect(check([base], [base], { openThreads: 2 }).discussion).toMatchObject({
      state: "open",
      details: ["2 threads are not resolved"],
    });
  });

  test("finds the supply where the bench expects it, or says where it went", () => {
    expect(check([base], [base]).supply?.state).toBe("checked");
    const many = Array.from({ length: 8 }, (_, i) => ({ ...base, id: `s${i}`, name: `s${i}` }));
    const found = check([base], [base, ...many]).supply;
    expect(found?.state).toBe("look");
    expect(found?.details[0]).toMatch(/^positive rail: .*, window so far /);
  });

  test("leaves to the person what no data can say", () => {
    const found = check([base], [base]);
    expect([found.measurements?.state, found.geometry?.state]).toEqual(["by hand", "by hand"]);
  });
});
