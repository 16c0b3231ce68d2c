import { openDatabase, workingCopies } from "#lib/db/index.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { removeVoice } from "#lib/server/voices/remove.ts";
import { readWorkingCopy } from "#lib/server/workingCopies/read.ts";
import { saveWorkingCopy } from "#lib/server/workingCopies/save.ts";
import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

async function begin() {
  const team = await makeTeam(db);
  const { id } = await createVoice({ ctx: await team.as("designer"), input: { name: "Rattle", template: "empty" } });
  return { team, id };
}

const documentWith = (...ids: string[]) =>
  workingCopyDocument.parse({ ...emptyDocument, stages: ids.map((id) => bandPassStage(id)) });

const rowOf = async (id: string) => (await db.select().from(workingCopies).where(eq(workingCopies.voiceId, id)))[0];

describe("saving a working copy", () => {
  test("keeps what was sent and gives a new ETag", async () => {
    const { team, id } = await begin();
    const ctx = await team.as("designer");
    const saved = await saveWorkingCopy({ ctx, input: { id, document: documentWith("s1"), expected: [1] } });
    expect(saved.etag).toBe('"v2"');
    expect(await readWorkingCopy({ ctx, input: { id } })).toEqual(saved);
    expect(saved.copy.stages).toEqual(documentWith("s1").stages);
  });

  test("over a newer copy is refused with that copy, which stays", async () => {
    const { team, id } = await begin();
    const ctx = await team.as("designer");
    await saveWorkingCopy({ ctx, input: { id, document: documentWith("s1"), expected: [1] } });
    const late = saveWorkingCopy({ ctx, input: { id, document: documentWith("s2"), expected: [1] } });
    await expect(late).rejects.toMatchObject({
      code: "stale-copy",
      headers: { etag: '"v2"' },
      members: { current: { stages: [{ id: "s1" }] } },
    });
    expect(await rowOf(id)).toMatchObject({ version: 2, document: { stages: [{ id: "s1" }] } });
  });

  test("by two people at once succeeds for exactly one", async () => {
    const { team, id } = await begin();
    const people = [await team.as("designer"), await team.as("owner")] as const;
    const tries = Array.from({ length: 10 }, (_, index) =>
      saveWorkingCopy({
        ctx: people[index % 2 ? 1 : 0],
        input: { id, document: documentWith(`s${index}`), expected: [1] },
      }),
    );
    const ends = await Promise.allSettled(tries);
    expect(ends.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const end of ends) if (end.status === "rejected") expect(end.reason).toMatchObject({ code: "stale-copy" });
    expect(await rowOf(id)).toMatchObject({ version: 2 });
  });

  test("while the voice is being removed ends without a deadlock", async () => {
    const { team, id } = await begin();
    const ctx = await team.as("designer");
    const [save, removal] = await Promise.allSettled([
      saveWorkingCopy({ ctx, input: { id, document: documentWith("s1"), expected: [1] } }),
      removeVoice({ ctx, input: { id } }),
    ]);
    expect(removal.status).toBe("fulfilled");
    if (save.status === "rejected") expect(save.reason).toMatchObject({ code: "not-found" });
    expect(await rowOf(id)).toBeUndefined();
  });

  test.each(["reviewer", "builder", "viewer"] as const)(
    "is refused to a %s, and the copy is unchanged",
    async (role) => {
      const { team, id } = await begin();
      const before = await rowOf(id);
      const input = { id, document: documentWith("s1"), expected: [1] };
      await expect(saveWorkingCopy({ ctx: await team.as(role), input })).rejects.toMatchObject({ code: "not-allowed" });
      expect(await rowOf(id)).toEqual(before);
    },
  );

  test("is refused to a stranger as if there were nothing", async () => {
    const { id } = await begin();
    const before = await rowOf(id);
    const ctx = await (await makeTeam(db)).as("owner");
    const input = { id, document: documentWith("s1"), expected: [1] };
    await expect(saveWorkingCopy({ ctx, input })).rejects.toMatchObject({ code: "not-found" });
    expect(await rowOf(id)).toEqual(before);
  });
});

describe("reading a working copy", () => {
  test.each(["owner", "designer", "reviewer", "builder"] as const)("is open to a %s", async (role) => {
    const { team, id } = await begin();
    expect((await readWorkingCopy({ ctx: await team.as(role), input: { id } })).etag).toBe('"v1"');
  });

  test("is closed to a viewer", async () => {
    const { team, id } = await begin();
    const reading = readWorkingCopy({ ctx: await team.as("viewer"), input: { id } });
    await expect(reading).rejects.toMatchObject({ code: "not-allowed" });
  });
});

describe("the database itself", () => {
  const put = async (document: unknown, version = 1) => {
    const { id } = await begin();
    return db.update(workingCopies).set({ document, version }).where(eq(workingCopies.voiceId, id));
  };
  const breaksCheck = { cause: { code: "23514" } };

  test.each([
    ["a list", []],
    ["a document without stages", { format: 1, links: [], conditions: {} }],
    ["stages that are no list", { format: 1, stages: {}, links: [], conditions: {} }],
    ["a format that is text", { format: "1", stages: [], links: [], conditions: {} }],
  ])("refuses %s as a document", async (_, document) => {
    await expect(put(document)).rejects.toMatchObject(breaksCheck);
  });

  test("refuses a version below 1", async () => {
    await expect(put(emptyDocument, 0)).rejects.toMatchObject(breaksCheck);
  });
});
