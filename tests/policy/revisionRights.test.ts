import {
  mayFollow,
  revisionRights,
  revisionStatuses,
  roles,
  statusTransitions,
  type Actor,
  type RevisionStatus,
  type Role,
} from "#lib/policy/index.ts";
import { describe, expect, test } from "vitest";

const person = (role: Role | null): Actor => ({
  userId: "usr_a",
  name: "Asta",
  email: "asta@example.test",
  team: role ? { id: "tea_own", name: "Own", slug: "own" } : null,
  role,
});

// What each role may do to a revision of each status that somebody else made, as the product promises it:
// read, restore, ask for review, decide, share.
const promised: Record<RevisionStatus, Record<Role, string>> = {
  "in preparation": {
    owner: "read restore ask - -",
    designer: "read restore ask - -",
    reviewer: "read - - - -",
    builder: "read - - - -",
    viewer: "- - - - -",
  },
  "under review": {
    owner: "read restore ask decide -",
    designer: "read restore ask - -",
    reviewer: "read - - decide -",
    builder: "read - - - -",
    viewer: "- - - - -",
  },
  returned: {
    owner: "read restore - - -",
    designer: "read restore - - -",
    reviewer: "read - - - -",
    builder: "read - - - -",
    viewer: "- - - - -",
  },
  released: {
    owner: "read restore - - share",
    designer: "read restore - - -",
    reviewer: "read - - - -",
    builder: "read - - - -",
    viewer: "read - - - -",
  },
  superseded: {
    owner: "read restore - - -",
    designer: "read restore - - -",
    reviewer: "read - - - -",
    builder: "read - - - -",
    viewer: "- - - - -",
  },
};

const cells = revisionStatuses.flatMap((status) => roles.map((role) => ({ status, role })));

const wordsOf = (actor: Actor | null, target: Parameters<typeof revisionRights>[1]) => {
  const { read, restore, askForReview, review, share } = revisionRights(actor, target);
  return [read && "read", restore && "restore", askForReview && "ask", review && "decide", share && "share"]
    .map((word) => word || "-")
    .join(" ");
};

describe("a revision that somebody else made", () => {
  test.each(cells)("$status, to a $role of the team", ({ status, role }) => {
    const target = { teamId: "tea_own", madeBy: "usr_b", status };
    expect(wordsOf(person(role), target)).toBe(promised[status][role]);
  });

  test.each(cells)("$status, is nothing to a $role of another team", ({ status, role }) => {
    const target = { teamId: "tea_other", madeBy: "usr_b", status, decision: "release" as const };
    expect(wordsOf(person(role), target)).toBe("- - - - -");
  });

  test.each(revisionStatuses)("%s, is nothing without a session or a team", (status) => {
    const target = { teamId: "tea_own", madeBy: "usr_a", status, decision: "release" as const };
    expect(wordsOf(null, target)).toBe("- - - - -");
    expect(wordsOf(person(null), target)).toBe("- - - - -");
  });
});

test.each(cells)("one's own, $status, is never decided on by a $role", ({ status, role }) => {
  const target = { teamId: "tea_own", madeBy: "usr_a", status };
  expect(revisionRights(person(role), target).review).toBe(false);
});

test("what was released stays readable to a viewer once it is superseded", () => {
  const target = { teamId: "tea_own", madeBy: "usr_b", status: "superseded" as const };
  expect(wordsOf(person("viewer"), { ...target, decision: "release" })).toBe("read - - - -");
  expect(wordsOf(person("viewer"), { ...target, decision: null })).toBe("- - - - -");
});

describe("the order of statuses", () => {
  test("leads from every status only forward, and ends", () => {
    for (const start of revisionStatuses) {
      const seen = new Set<RevisionStatus>();
      const walk = (status: RevisionStatus) => {
        for (const next of statusTransitions[status]) {
          expect(next).not.toBe(start);
          if (!seen.has(next)) walk(next);
          seen.add(next);
        }
      };
      walk(start);
    }
  });

  test("reaches a release and a return through a review alone", () => {
    const before = (wanted: RevisionStatus) => revisionStatuses.filter((status) => mayFollow(status, wanted));
    expect(before("released")).toEqual(["under review"]);
    expect(before("returned")).toEqual(["under review"]);
  });
});
