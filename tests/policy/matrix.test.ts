import { actions, can, decide, roles, type Action, type Actor, type Role } from "#lib/policy/index.ts";
import { describe, expect, test } from "vitest";

// The table of roles as the product promises it, in the order of `roles`: owner, designer, reviewer, builder, viewer.
const promised: Record<Action, string> = {
  "voice.list": "yes yes yes yes yes",
  "voice.read": "yes yes yes yes yes",
  "voice.create": "yes yes no no no",
  "voice.rename": "yes yes no no no",
  "voice.remove": "yes yes no no no",
  "voice.removeReleased": "yes no no no no",
  "workingCopy.read": "yes yes yes yes no",
  "workingCopy.edit": "yes yes no no no",
  "revision.readReleased": "yes yes yes yes yes",
  "revision.read": "yes yes yes yes no",
  "revision.make": "yes yes no no no",
  "revision.askForReview": "yes yes no no no",
  "revision.review": "yes no yes no no",
  "comment.read": "yes yes yes yes no",
  "comment.write": "yes yes yes yes no",
  "comment.change": "no no no no no", // only one's own, see below
  "comment.resolve": "yes yes yes yes no",
  "activity.read": "yes yes yes yes no",
  "measurement.add": "yes yes yes yes no",
  "build.keep": "yes yes yes yes no",
  "partData.edit": "yes yes no no no",
  "shareLink.make": "yes no no no no",
  "shareLink.revoke": "yes no no no no",
  "shareLink.list": "yes no no no no",
  "team.read": "yes yes yes yes yes",
  "team.rename": "yes no no no no",
  "team.invite": "yes no no no no",
  "team.changeRoles": "yes no no no no",
  "team.handOver": "yes no no no no",
};

const person = (role: Role | null): Actor => ({
  userId: "usr_a",
  name: "Asta",
  email: "asta@example.test",
  team: role ? { id: "tea_own", name: "Own", slug: "own" } : null,
  role,
});

const cells = actions.flatMap((action) =>
  roles.map((role, column) => ({ action, role, allowed: promised[action].split(" ")[column] === "yes" })),
);

describe("the role table", () => {
  test("has a promised row for each action and no other", () => {
    expect(Object.keys(promised).sort()).toEqual([...actions].sort());
  });

  test.each(cells)("$role, $action on someone else's work in the own team: $allowed", ({ action, role, allowed }) => {
    expect(can(person(role), action, { teamId: "tea_own", madeBy: "usr_b" })).toBe(allowed);
  });

  test.each(cells)("$role never does $action to another team's work", ({ action, role }) => {
    expect(decide(person(role), action, { teamId: "tea_other", madeBy: "usr_a" })).toEqual({
      allowed: false,
      reason: "other-team",
    });
  });

  test.each(actions)("nobody without a session or a team does %s", (action) => {
    expect(decide(null, action, { teamId: "tea_own" })).toEqual({ allowed: false, reason: "no-session" });
    expect(decide(person(null), action, { teamId: "tea_own" })).toEqual({ allowed: false, reason: "no-team" });
  });
});

describe("one's own work", () => {
  const own = { teamId: "tea_own", madeBy: "usr_a" };

  test.each(roles)("%s never reviews it", (role) => {
    expect(can(person(role), "revision.review", own)).toBe(false);
  });

  test("an owner is told that this is the reason", () => {
    expect(decide(person("owner"), "revision.review", own)).toEqual({ allowed: false, reason: "own-work" });
  });

  test.each(roles.map((role) => ({ role, allowed: role !== "viewer" })))(
    "$role changes a comment of their own: $allowed",
    ({ role, allowed }) => {
      expect(can(person(role), "comment.change", own)).toBe(allowed);
    },
  );
});
