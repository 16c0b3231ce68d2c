import type { Role } from "#lib/policy/index.ts";

/** What each role is for, in the words of the people who hold it. The rights themselves are in the policy's matrix. */
export const roleWords: Record<Role, string> = {
  owner: "Everything: the team and its roles as well",
  designer: "Edits working copies and makes revisions",
  reviewer: "Reads working copies; releases or returns revisions",
  builder: "Reads working copies; records measurements and builds",
  viewer: "Reads what has been released",
};
