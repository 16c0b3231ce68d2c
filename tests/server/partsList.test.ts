import { openDatabase } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { makeRevision } from "#lib/server/revisions/make.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { readPartsList } from "#lib/server/voices/partsList.ts";
import { saveWorkingCopy } from "#lib/server/workingCopies/save.ts";
import { partsListAnswer } from "#lib/wire/partsList.ts";
import { partsListCsv } from "#lib/wire/partsListCsv.ts";
import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

async function begin() {
  const team = await makeTeam(db);
  const ctx = await team.as("designer");
  const { id } = await createVoice({ ctx, input: { name: "Rattle", template: "empty" } });
  const stages = [
    { ...bandPassStage("a", { ra: "R10", rf: "R2", c1: "C1" }), name: 'Body, "low"', notFitted: ["c1"] },
    bandPassStage("b"),
  ];
  const document = workingCopyDocument.parse({ ...emptyDocument, stages });
  await saveWorkingCopy({ ctx, input: { id, document, expected: [1] } });
  return { team, id };
}

describe("the parts list", () => {
  test("answers what its description says, for as many boards as asked", async () => {
    const { team, id } = await begin();
    const list = await readPartsList({ ctx: await team.as("builder"), input: { id, boards: 3 } });
    expect(partsListAnswer.parse(list)).toEqual(list);
    expect(list.parts).toHaveLength(10);
    expect(list.parts.find(({ designator }) => designator === "R10")).toMatchObject({ value: 22000, quantity: 3 });
    expect(list.parts.find(({ designator }) => designator === "C1")).toMatchObject({ fitted: false, quantity: 0 });
    expect(list.values.find(({ value }) => value === 1e-8)).toMatchObject({ quantity: 9 });
    expect(list.packages).toMatchObject([{ quantity: 3, spare: 0 }]);
  });

  test("as CSV stands by designator, quotes what needs it, and leaves no row out", async () => {
    const { team, id } = await begin();
    const text = partsListCsv(await readPartsList({ ctx: await team.as("builder"), input: { id, boards: 2 } }));
    const lines = text.split("\r\n");
    expect(lines[0]).toBe("designator,quantity,value,value (SI),unit,tolerance,type,stage,role,fitted");
    expect(lines[1]).toMatch(/^C1,0,10n,1e-8,F,0\.05,film or class 1 ceramic capacitor,"Body, ""low""",.*,not fitted$/);
    expect(lines[2]).toMatch(/^R2,2,100k,100000,Ω,0\.01,film resistor,"Body, ""low""",/);
    expect(lines[3]).toMatch(/^R10,2,22k,22000,/);
    expect(lines).toHaveLength(1 + 10 + 2 + 1);
    expect(lines.at(-1)).toBe("");
  });

  test.each(roles)("of a working copy is open to a %s as the working copy is", async (role) => {
    const { team, id } = await begin();
    const reading = readPartsList({ ctx: await team.as(role), input: { id, boards: 1 } });
    if (role === "viewer") await expect(reading).rejects.toMatchObject({ code: "not-allowed" });
    else expect((await reading).revision).toBe("working");
  });

  test("of a revision is what was kept, and is nothing to another team", async () => {
    const { team, id } = await begin();
    const ctx = await team.as("designer");
    const { number } = await makeRevision({
      ctx,
      input: { id, reason: "First", acceptedWarnings: [], expected: null },
    });
    const document = workingCopyDocument.parse({ ...emptyDocument, stages: [] });
    await saveWorkingCopy({ ctx, input: { id, document, expected: [2] } });
    const kept = await readPartsList({ ctx, input: { id, boards: 1, revision: number } });
    expect([kept.revision, kept.parts.length]).toEqual([1, 10]);
    expect((await readPartsList({ ctx, input: { id, boards: 1 } })).parts).toEqual([]);
    const stranger = await (await makeTeam(db)).as("owner");
    for (const revision of [undefined, number]) {
      const reading = readPartsList({ ctx: stranger, input: { id, boards: 1, ...(revision && { revision }) } });
      await expect(reading).rejects.toMatchObject({ code: "not-found" });
    }
  });
});
