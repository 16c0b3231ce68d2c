import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { describe, expect, test } from "vitest";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

const pathsOf = (document: unknown) => {
  const parsed = workingCopyDocument.safeParse(document);
  return parsed.success ? [] : parsed.error.issues.map(({ path }) => path.join("."));
};

const link = (id: string, from: string, to: string) => ({
  id,
  from: { stage: from, port: "out" },
  to: { stage: to, port: "in" },
});

describe("a working copy document", () => {
  test("takes stages, links between them and conditions", () => {
    const stages = [bandPassStage("a", { ra: "R1", c1: "C1" }), bandPassStage("b", { ra: "R2", c1: "C2" })];
    expect(
      pathsOf({ ...emptyDocument, stages, links: [link("l", "a", "b")], conditions: { temperature: 300 } }),
    ).toEqual([]);
    expect(pathsOf({ ...emptyDocument, stages: [{ ...stages[0], apart: true }] })).toEqual([]);
  });

  test("may be sent back as it was answered", () => {
    const stamps = { id: "voi_1", createdAt: "2030-01-01T00:00:00.000Z", updatedAt: "2030-01-01T00:00:00.000Z" };
    expect(pathsOf({ ...emptyDocument, ...stamps })).toEqual([]);
  });

  test.each([
    ["two stages of one id", { stages: [bandPassStage("a"), bandPassStage("a")] }, ["stages.1.id"]],
    [
      "a designator twice in a voice",
      { stages: [bandPassStage("a", { ra: "R1" }), bandPassStage("b", { rf: "R1" })] },
      ["stages.1.designators.rf"],
    ],
    [
      "a designator twice in a stage",
      { stages: [bandPassStage("a", { ra: "R1", rf: "R1" })] },
      ["stages.0.designators.rf"],
    ],
    ["a link to no stage", { stages: [bandPassStage("a")], links: [link("l", "a", "z")] }, ["links.0.to.stage"]],
    [
      "two links of one id",
      {
        stages: [bandPassStage("a"), bandPassStage("b"), bandPassStage("c")],
        links: [link("l", "a", "b"), link("l", "b", "c")],
      },
      ["links.1.id"],
    ],
    ["a stage that feeds itself", { stages: [bandPassStage("a")], links: [link("l", "a", "a")] }, ["links.0"]],
    [
      "a circle",
      { stages: [bandPassStage("a"), bandPassStage("b")], links: [link("l", "a", "b"), link("m", "b", "a")] },
      ["links.1"],
    ],
    [
      "an input fed twice",
      {
        stages: [bandPassStage("a"), bandPassStage("b"), bandPassStage("c")],
        links: [link("l", "a", "c"), link("m", "b", "c")],
      },
      ["links.1.to.port"],
    ],
    [
      "a link to no port",
      {
        stages: [bandPassStage("a"), bandPassStage("b")],
        links: [{ ...link("l", "a", "b"), from: { stage: "a", port: "tail" } }],
      },
      ["links.0.from.port"],
    ],
    ["a stage of no known kind", { stages: [{ ...bandPassStage("a"), kind: "z" }] }, ["stages.0.kind"]],
    [
      "a designator of 300 characters",
      { stages: [bandPassStage("a", { ra: `R${"1".repeat(299)}` })] },
      ["stages.0.designators.ra"],
    ],
    ["10,000 stages", { stages: Array.from({ length: 10_000 }, () => ({})) }, ["stages"]],
    ["another format", { format: 2 }, ["format"]],
    ["an extra field", { notes: "x" }, [""]],
    ["no stages", { stages: undefined }, ["stages"]],
    ["more than 500 stages", { stages: Array.from({ length: 501 }, (_, n) => bandPassStage(`s${n}`)) }, ["stages"]],
  ])("refuses %s and says where", (_, change, paths) => {
    expect(pathsOf({ ...emptyDocument, ...change })).toEqual(paths);
  });

  test("takes 500 stages", () => {
    const stages = Array.from({ length: 500 }, (_, n) => bandPassStage(`s${n}`));
    expect(pathsOf({ ...emptyDocument, stages })).toEqual([]);
  });
});
