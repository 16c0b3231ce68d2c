import { openDatabase } from "#lib/db/index.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { listVoices } from "#lib/server/voices/list.ts";
import { voiceListQuery } from "#lib/wire/voice.ts";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam, type TestTeam } from "../support/people.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const query = (input: Record<string, unknown>) => voiceListQuery.parse(input);

async function teamWith(names: readonly string[]) {
  let minute = 0;
  const team = await makeTeam(db, () => new Date(Date.UTC(2030, 0, 1, 0, (minute += 1))));
  for (const name of names) await createVoice({ ctx: await team.as("designer"), input: { name, template: "empty" } });
  return team;
}

/** Names on each page, following the cursors to the end. */
async function walk(team: TestTeam, input: Record<string, unknown>) {
  const ctx = await team.as("viewer");
  const pages: string[][] = [];
  let cursor: string | null = null;
  do {
    const page: Awaited<ReturnType<typeof listVoices>> = await listVoices({
      ctx,
      input: query({ ...input, ...(cursor ? { cursor } : {}) }),
    });
    pages.push(page.voices.map(({ name }) => name));
    cursor = page.nextCursor;
  } while (cursor);
  return pages;
}

describe("the list of voices", () => {
  test("comes in pages, newest first, each voice once", async () => {
    const team = await teamWith(["a", "b", "c", "d", "e"]);
    expect(await walk(team, { limit: 2 })).toEqual([["e", "d"], ["c", "b"], ["a"]]);
    expect(await walk(team, { limit: 2, sort: "created" })).toEqual([["e", "d"], ["c", "b"], ["a"]]);
  });

  test("ends with the last full page", async () => {
    expect(await walk(await teamWith(["a", "b"]), { limit: 2 })).toEqual([["b", "a"]]);
  });

  test("goes by name when asked, also where two share one", async () => {
    const team = await teamWith(["birch", "ash", "ash", "cedar"]);
    expect(await walk(team, { limit: 1, sort: "name" })).toEqual([["ash"], ["ash"], ["birch"], ["cedar"]]);
  });

  test("is narrowed by name, where % and _ are only themselves", async () => {
    const team = await teamWith(["Snap 5%", "Snap 50", "snapdragon_1", "Crackle"]);
    expect(await walk(team, { name: "snap" })).toEqual([["snapdragon_1", "Snap 50", "Snap 5%"]]);
    expect(await walk(team, { name: "5%" })).toEqual([["Snap 5%"]]);
    expect(await walk(team, { name: "p_5" })).toEqual([[]]);
  });

  test("holds nothing of another team", async () => {
    await teamWith(["theirs"]);
    expect(await walk(await teamWith([]), {})).toEqual([[]]);
  });

  const encoded = (value: unknown) => Buffer.from(JSON.stringify(value)).toString("base64url");

  test.each([
    ["nonsense", "nonsense"],
    ["one of another order", encoded(["name", "a", "b"])],
    ["one without a moment", encoded(["updated", "x", "b"])],
  ])("refuses as cursor %s", async (_, cursor) => {
    const ctx = await (await makeTeam(db)).as("owner");
    await expect(listVoices({ ctx, input: query({ cursor }) })).rejects.toMatchObject({
      code: "invalid-input",
      errors: [{ path: "cursor" }],
    });
  });
});
