import { begin, redo, step, undo } from "#lib/client/voice/history.ts";
import { mergeDocuments } from "#lib/client/voice/mergeDocuments.ts";
import type { WorkingCopyDocument } from "#lib/client/workingCopy.ts";
import { describe, expect, test } from "vitest";
import { bandPassStage } from "../support/stages.ts";

const stage = (id: string, ra = 22e3) => ({ ...bandPassStage(id), parts: { ...bandPassStage(id).parts, ra } });
const link = (id: string, from: string, to: string) => ({
  id,
  from: { stage: from, port: "out" },
  to: { stage: to, port: "in" },
});
const document = (over: Partial<WorkingCopyDocument> = {}): WorkingCopyDocument => ({
  format: 1,
  stages: [stage("a"), stage("b"), stage("c")],
  links: [link("l", "a", "b")],
  conditions: {},
  ...over,
});
const ids = ({ stages }: WorkingCopyDocument) => stages.map(({ id }) => id);

describe("two changes of one document", () => {
  const base = document();

  test("to different stages come together", () => {
    const mine = document({ stages: [stage("a", 1e3), stage("b"), stage("c")] });
    const theirs = document({ stages: [stage("a"), stage("b", 2e3), stage("c")] });
    const { document: merged, clashes } = mergeDocuments(base, mine, theirs);
    expect(clashes).toEqual([]);
    expect(merged.stages.map(({ parts }) => parts.ra)).toEqual([1e3, 2e3, 22e3]);
  });

  test("additions and removals of both stand, and links to what is gone go with it", () => {
    const mine = document({
      stages: [stage("a"), stage("b"), stage("c"), stage("m")],
      links: [link("l", "a", "b"), link("n", "b", "m")],
    });
    const theirs = document({ stages: [stage("t"), stage("a"), stage("c")], links: [] });
    const { document: merged, clashes } = mergeDocuments(base, mine, theirs);
    expect(clashes).toEqual([]);
    expect(ids(merged).sort()).toEqual(["a", "c", "m", "t"]);
    expect(merged.links).toEqual([]);
  });

  test("to one stage clash, and whoever is chosen stands", () => {
    const mine = document({ stages: [stage("a", 1e3), stage("b"), stage("c")] });
    const theirs = document({ stages: [stage("b", 5e3), stage("c")], links: [] });
    const open = mergeDocuments(base, mine, theirs);
    expect(open.clashes).toEqual([{ id: "a", name: "Band a", mine: "changed", theirs: "removed" }]);
    expect(open.document.stages.find(({ id }) => id === "a")?.parts.ra).toBe(1e3);
    const settled = mergeDocuments(base, mine, theirs, { a: "theirs" });
    expect(ids(settled.document)).toEqual(["b", "c"]);
    expect(settled.document.stages[0]!.parts.ra).toBe(5e3);
  });

  test("that agree do not clash", () => {
    const both = document({ stages: [stage("a", 1e3), stage("b"), stage("c")] });
    expect(mergeDocuments(base, both, structuredClone(both))).toEqual({ document: both, clashes: [] });
  });

  test("that feed one input keep one of the links", () => {
    const mine = document({ links: [...base.links, link("m", "a", "c")] });
    const theirs = document({ links: [...base.links, link("t", "b", "c")] });
    expect(mergeDocuments(base, mine, theirs).document.links.map(({ id }) => id)).toEqual(["l", "t"]);
  });

  test("to the conditions of the voice clash as one place", () => {
    const { clashes } = mergeDocuments(
      base,
      document({ conditions: { temperature: 300 } }),
      document({ conditions: { temperature: 310 } }),
    );
    expect(clashes).toEqual([{ id: "", name: "Conditions of the voice", mine: "changed", theirs: "changed" }]);
  });

  test("keep my order where they moved nothing, and theirs where they did", () => {
    const moved = document({ stages: [stage("c"), stage("a"), stage("b")] });
    expect(ids(mergeDocuments(base, moved, base).document)).toEqual(["c", "a", "b"]);
    expect(ids(mergeDocuments(base, base, moved).document)).toEqual(["c", "a", "b"]);
  });
});

test("steps are taken back and done again, and a new one forgets what was taken back", () => {
  const two = step(step(begin(0), 1), 2);
  expect(undo(two).now).toBe(1);
  expect(undo(undo(undo(two))).now).toBe(0);
  expect(redo(undo(two))).toEqual(two);
  expect(redo(step(undo(two), 9))).toMatchObject({ now: 9, future: [] });
  expect(step(two, 2)).toBe(two);
});
