import { auditEvents, newId, type Queryable } from "#lib/db/index.ts";
import type { Action } from "#lib/policy/index.ts";

interface Deed {
  teamId: string;
  actorId: string;
  action: Action;
  subjectId: string;
  detail?: Record<string, unknown>;
  at: Date;
}

/** Writes down a deed; called inside the transaction that does it, so that neither happens without the other. */
export async function recordDeed(tx: Queryable, deed: Deed): Promise<void> {
  await tx.insert(auditEvents).values({ id: newId("evt"), ...deed });
}
