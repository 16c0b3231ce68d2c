import { users, type Database } from "#lib/db/index.ts";
import { inArray } from "drizzle-orm";
import { demoPeople } from "./accounts.ts";

export class DemoAccountsError extends Error {
  override readonly name = "DemoAccountsError";

  constructor(emails: readonly string[]) {
    super(
      `This database holds demo accounts, whose password is public: ${emails.join(", ")}.\nA production start refuses it. Point DATABASE_URL at a database of its own, or remove these accounts first.`,
    );
  }
}

/** A server for real work does not start on a database that anyone can sign in to. */
export async function refuseDemoAccounts(db: Database): Promise<void> {
  const emails = demoPeople.map(({ email }) => email);
  const found = await db
    .select({ email: users.email })
    .from(users)
    .where(inArray(users.email, emails))
    .orderBy(users.email);
  if (found.length > 0) throw new DemoAccountsError(found.map(({ email }) => email));
}
