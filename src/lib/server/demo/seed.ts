import {
  accounts,
  members,
  newId,
  teams,
  users,
  voices,
  workingCopies,
  type Database,
  type Transaction,
} from "#lib/db/index.ts";
import type { VoiceTemplateId } from "#lib/circuit/kinds/templates.ts";
import type { Role } from "#lib/policy/index.ts";
import { hashPassword } from "better-auth/crypto";
import { and, eq } from "drizzle-orm";
import { startingDocument } from "../workingCopies/startingDocument.ts";
import { demoPassword, demoPeople, demoTeam } from "./accounts.ts";
import { reviseDemoVoice } from "./revisions.ts";

const demoVoices: readonly { name: string; template: VoiceTemplateId; revised: boolean }[] = [
  { name: "Woodpeck", template: "struck-tone", revised: false },
  { name: "Shingle", template: "two-path-noise", revised: true },
];

async function ensurePerson(tx: Transaction, { email, name }: { email: string; name: string }): Promise<string> {
  const [known] = await tx.select({ id: users.id }).from(users).where(eq(users.email, email));
  if (known) return known.id;
  const id = newId("usr");
  await tx.insert(users).values({ id, name, email, emailVerified: true });
  const password = await hashPassword(demoPassword);
  await tx.insert(accounts).values({ id: newId("acc"), userId: id, providerId: "credential", accountId: id, password });
  return id;
}

async function ensureTeam(tx: Transaction): Promise<{ id: string; isNew: boolean }> {
  const [known] = await tx.select({ id: teams.id }).from(teams).where(eq(teams.slug, demoTeam.slug));
  if (known) return { id: known.id, isNew: false };
  const id = newId("tea");
  await tx.insert(teams).values({ id, ...demoTeam });
  return { id, isNew: true };
}

async function demoPerson(tx: Transaction, teamId: string, role: Role) {
  const [person] = await tx
    .select({ id: users.id, name: users.name })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(eq(members.organizationId, teamId), eq(members.role, role)));
  return person;
}

async function beginVoices(tx: Transaction, teamId: string): Promise<void> {
  const [designer, reviewer] = [await demoPerson(tx, teamId, "designer"), await demoPerson(tx, teamId, "reviewer")];
  const author = designer?.id ?? null;
  const now = Date.now();
  for (const [index, { name, template, revised }] of demoVoices.entries()) {
    const id = newId("voi");
    // A minute apart, so that the list has one order.
    const at = new Date(now - (demoVoices.length - index) * 60_000);
    const stamps = { createdAt: at, updatedAt: at };
    await tx.insert(voices).values({ id, teamId, name, createdBy: author, ...stamps });
    const document = startingDocument(template);
    await tx.insert(workingCopies).values({ voiceId: id, document, updatedBy: author, ...stamps });
    if (revised && designer && reviewer) {
      await reviseDemoVoice(tx, { voiceId: id, document, author: designer, reviewer, now });
    }
  }
}

/** Puts the demo team, its people and their voices into the database. Run again, it changes nothing that people did since. */
export async function seedDemo(db: Database): Promise<void> {
  await db.transaction(async (tx) => {
    const team = await ensureTeam(tx);
    for (const person of demoPeople) {
      const userId = await ensurePerson(tx, person);
      await tx
        .insert(members)
        .values({ id: newId("mem"), organizationId: team.id, userId, role: person.role })
        .onConflictDoNothing();
    }
    if (team.isNew) await beginVoices(tx, team.id);
  });
}
