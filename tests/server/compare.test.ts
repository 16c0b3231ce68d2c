import { openDatabase } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { compareRevisions } from "#lib/server/compare/compare.ts";
import { compareAnswer, compareQuery } from "#lib/wire/compare.ts";
import { compareCsv } from "#lib/wire/compareCsv.ts";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { makeVoice, type TestVoice } from "../support/revisions.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

async function twoRevisions(): Promise<TestVoice> {
  const voice = await makeVoice(db);
  await voice.save(2200);
  await voice.make("as drawn");
  await voice.save(1800);
  await voice.make("darker");
  return voice;
}

const query = (id: string, given: Record<string, unknown>) => ({ id, ...compareQuery.parse(given) });

describe("comparing", () => {
  test("two revisions gives parts, results and curves in the shape that is described", async () => {
    const { team, id } = await twoRevisions();
    const found = await compareRevisions({ ctx: await team.as("builder"), input: query(id, { from: 1, to: 2 }) });
    expect(compareAnswer.parse(found)).toEqual(found);
    expect(found.parts).toMatchObject([{ designator: "R2", from: 2200, to: 1800 }]);
    expect(found.from).toMatchObject({ revision: 1, reason: "as drawn", status: "in preparation" });
    expect(found.results.map(({ name }) => name)).toContain("centreFrequency");
    for (const { x, from, to, difference } of found.curves) {
      expect([from.length, to.length, difference.length]).toEqual([x.length, x.length, x.length]);
      expect([...x, ...from, ...to, ...difference].every(Number.isFinite)).toBe(true);
    }
    expect(found.checklist.map(({ id: item }) => item)).toContain("unique");
  });

  test("without a side takes the last release and the working copy", async () => {
    const { team, id, release, save } = await twoRevisions();
    await release(1);
    await save(1500);
    const found = await compareRevisions({ ctx: await team.as("builder"), input: query(id, {}) });
    expect([found.from.revision, found.to.revision]).toEqual([1, "working"]);
    expect(found.parts).toMatchObject([{ from: 2200, to: 1500 }]);
  });

  test("a first revision with nothing finds everything new", async () => {
    const { team, id } = await twoRevisions();
    const found = await compareRevisions({ ctx: await team.as("builder"), input: query(id, { to: 1 }) });
    expect(found.from.revision).toBe("nothing");
    expect(found.stages.added).toMatchObject([{ stage: "band" }]);
  });

  test("two voices of a team pairs their stages", async () => {
    const { team, id } = await twoRevisions();
    const other = await makeVoice(db, team);
    await other.save(2700);
    const ctx = await team.as("reviewer");
    const found = await compareRevisions({ ctx, input: query(id, { fromVoice: other.id, from: "working", to: 1 }) });
    expect(found.parts).toMatchObject([{ from: 2700, to: 2200 }]);
  });

  test("one stage gives all its curves, none gives none", async () => {
    const { team, id } = await twoRevisions();
    const ctx = await team.as("builder");
    const of = (more: Record<string, unknown>) =>
      compareRevisions({ ctx, input: query(id, { from: 1, to: 1, ...more }) });
    expect((await of({})).curves).toEqual([]);
    expect((await of({ stage: "band" })).curves.length).toBeGreaterThan(0);
    expect((await of({ stage: "band", curves: "none" })).curves).toEqual([]);
  });

  test("a viewer compares released revisions and is shown no other", async () => {
    const { team, id, release } = await twoRevisions();
    await release(1);
    const ctx = await team.as("viewer");
    await expect(compareRevisions({ ctx, input: query(id, { from: 1, to: 2 }) })).rejects.toMatchObject({
      code: "not-allowed",
    });
    await expect(compareRevisions({ ctx, input: query(id, {}) })).rejects.toMatchObject({ code: "not-allowed" });
    await release(2);
    expect((await compareRevisions({ ctx, input: query(id, { from: 1, to: 2 }) })).parts).toHaveLength(1);
  });

  test.each(roles)("another team's voice does not exist for its %s, on neither side", async (role) => {
    const { id } = await twoRevisions();
    const theirs = await makeTeam(db);
    const ctx = await theirs.as(role);
    await expect(compareRevisions({ ctx, input: query(id, { from: 1, to: 2 }) })).rejects.toMatchObject({
      code: "not-found",
    });
    const own = await makeVoice(db, theirs);
    await own.make();
    await own.release(1);
    const across = query(own.id, { fromVoice: id, from: 1, to: 1 });
    await expect(compareRevisions({ ctx, input: across })).rejects.toMatchObject({ code: "not-found" });
  });
});

test("as CSV it holds one row for each change, in SI units", async () => {
  const { team, id } = await twoRevisions();
  const found = await compareRevisions({ ctx: await team.as("builder"), input: query(id, { from: 1, to: 2 }) });
  const lines = compareCsv(found).split("\r\n");
  expect(lines[0]).toBe("what,stage,designator,name,from,to,unit,change,verdict");
  expect(lines.find((line) => line.startsWith("part,"))).toMatch(/^part,Band band,R2,.*,2200,1800,Ω,-0\.18/);
});
