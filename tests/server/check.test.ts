import { openDatabase } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { makeRevision } from "#lib/server/revisions/make.ts";
import { checkDocument } from "#lib/server/voices/check.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { saveWorkingCopy } from "#lib/server/workingCopies/save.ts";
import { checkAnswer } from "#lib/wire/check.ts";
import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const accepted = [{ stage: "", code: "no-reverse-protection", reason: "Keyed header", by: "The designer" }];

async function begin() {
  const team = await makeTeam(db);
  const ctx = await team.as("designer");
  const { id } = await createVoice({ ctx, input: { name: "Rattle", template: "empty" } });
  const document = workingCopyDocument.parse({
    ...emptyDocument,
    stages: [bandPassStage("a"), bandPassStage("b")],
    accepted,
  });
  await saveWorkingCopy({ ctx, input: { id, document, expected: [1] } });
  return { team, id, ctx };
}

describe("checking a voice", () => {
  test("answers what its description says, acceptances included", async () => {
    const { id, ctx } = await begin();
    const found = await checkDocument({ ctx, input: { id } });
    expect(checkAnswer.parse(found)).toEqual(found);
    expect(found.items.find(({ code }) => code === "no-reverse-protection")?.accepted?.reason).toBe("Keyed header");
    expect(found.supply.positive.typical).toBeCloseTo(2 * 1.4e-3 + 1e-3, 9);
  });

  test("of a revision keeps what was accepted then", async () => {
    const { id, ctx } = await begin();
    const { number } = await makeRevision({
      ctx,
      input: { id, reason: "First", acceptedWarnings: [], expected: null },
    });
    await saveWorkingCopy({ ctx, input: { id, document: workingCopyDocument.parse(emptyDocument), expected: [2] } });
    expect((await checkDocument({ ctx, input: { id } })).items).toEqual([]);
    const kept = await checkDocument({ ctx, input: { id, revision: number } });
    expect(kept.items.some((item) => item.accepted?.by === "The designer")).toBe(true);
  });

  test.each(roles)("is open to a %s as the working copy is", async (role) => {
    const { team, id } = await begin();
    const checking = checkDocument({ ctx: await team.as(role), input: { id } });
    if (role === "viewer") await expect(checking).rejects.toMatchObject({ code: "not-allowed" });
    else expect((await checking).revision).toBe("working");
  });

  test("is nothing to another team", async () => {
    const { id } = await begin();
    const ctx = await (await makeTeam(db)).as("owner");
    await expect(checkDocument({ ctx, input: { id } })).rejects.toMatchObject({ code: "not-found" });
  });
});
