import { auditEvents, newId, type Queryable } from "#lib/db/index.ts";
import type { DeedName } from "#lib/policy/index.ts";

interface Deed {
  teamId: string;
  /** Null where nobody was signed in: a guest who opened a link. */
  actorId: string | null;
  action: DeedName;
  subjectId: string;
  detail?: Record<string, unknown>;
  at: Date;
}

/** Writes down a deed; called inside the transaction that does it, so that neither happens without the other. */
export async function recordDeed(tx: Queryable, deed: Deed): Promise<void> {
  await tx.insert(auditEvents).values({ id: newId("evt"), ...deed });
}
