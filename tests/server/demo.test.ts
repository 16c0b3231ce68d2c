import { accounts, members, openDatabase, teams, users, voices, workingCopies } from "#lib/db/index.ts";
import { demoPassword, demoPeople, demoTeam } from "#lib/server/demo/accounts.ts";
import { refuseDemoAccounts } from "#lib/server/demo/refuse.ts";
import { seedDemo } from "#lib/server/demo/seed.ts";
import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { verifyPassword } from "better-auth/crypto";
import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, test } from "vitest";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

describe("before the demo is seeded", () => {
  test("a production start accepts the database", async () => {
    await expect(refuseDemoAccounts(db)).resolves.toBeUndefined();
  });
});

describe("the demo", () => {
  beforeAll(async () => {
    await seedDemo(db);
  });

  const people = () =>
    db
      .select({ email: users.email, verified: users.emailVerified, role: members.role, hash: accounts.password })
      .from(members)
      .innerJoin(teams, eq(teams.id, members.organizationId))
      .innerJoin(users, eq(users.id, members.userId))
      .innerJoin(accounts, eq(accounts.userId, users.id))
      .where(eq(teams.slug, demoTeam.slug))
      .orderBy(users.email);

  test("has one verified person of each role, who has the known password", async () => {
    const found = await people();
    const expected = demoPeople.map(({ email, role }) => ({ email, role }));
    expect(found.map(({ email, role }) => ({ email, role }))).toEqual(expect.arrayContaining(expected));
    expect(found).toHaveLength(5);
    for (const { verified, hash } of found) {
      expect(verified).toBe(true);
      expect(await verifyPassword({ hash: hash ?? "", password: demoPassword })).toBe(true);
    }
  });

  test("has voices whose stages pass the check of what people send", async () => {
    const found = await db
      .select({ name: voices.name, document: workingCopies.document })
      .from(voices)
      .innerJoin(workingCopies, eq(workingCopies.voiceId, voices.id));
    expect(found.map(({ name }) => name).sort()).toEqual(["Shingle", "Woodpeck"]);
    for (const { document } of found) expect(workingCopyDocument.parse(document).stages.length).toBeGreaterThan(0);
  });

  test("seeded again is the same, and what people did since stays", async () => {
    const [shingle] = await db.select().from(voices).where(eq(voices.name, "Shingle"));
    await db
      .update(voices)
      .set({ name: "Shingle B" })
      .where(eq(voices.id, shingle?.id ?? ""));
    const all = async () => ({ people: await people(), voices: await db.select().from(voices).orderBy(voices.id) });
    const before = await all();
    await seedDemo(db);
    expect(await all()).toEqual(before);
  });

  test("is refused by a production start, which names the accounts", async () => {
    await expect(refuseDemoAccounts(db)).rejects.toThrow(/builder@demo\.test, .*viewer@demo\.test[\s\S]*production/);
  });
});
