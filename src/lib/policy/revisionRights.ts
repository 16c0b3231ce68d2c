import type { Actor } from "./actor.ts";
import { can } from "./can.ts";
import { mayFollow, type RevisionStatus } from "./revisionStatus.ts";

/** What decides about a revision: whose it is, who made it, and where it stands. */
export interface RevisionTarget {
  teamId: string;
  madeBy: string | null;
  status: RevisionStatus;
}

export interface RevisionRights {
  read: boolean;
  restore: boolean;
  askForReview: boolean;
  /** Release or return it. */
  review: boolean;
  share: boolean;
}

/** Whether it has been released, now or before a later one took its place. */
export const wasReleased = (revision: { status: RevisionStatus; decision?: "release" | "return" | null }): boolean =>
  revision.status === "released" || revision.decision === "release";

/** What this person may do to a revision as it stands now: the role table and the order of its statuses taken together. */
export function revisionRights(
  actor: Actor | null,
  revision: RevisionTarget & { decision?: "release" | "return" | null },
): RevisionRights {
  const { teamId, madeBy, status } = revision;
  const target = { teamId, madeBy };
  const released = wasReleased(revision);
  const read = can(actor, "revision.read", target) || (released && can(actor, "revision.readReleased", target));
  return {
    read,
    restore: read && can(actor, "workingCopy.edit", target),
    // Asked again while it waits, it goes to somebody else.
    askForReview:
      can(actor, "revision.askForReview", target) && (mayFollow(status, "under review") || status === "under review"),
    review: can(actor, "revision.review", target) && mayFollow(status, "released"),
    share: can(actor, "shareLink.make", target) && status === "released",
  };
}
