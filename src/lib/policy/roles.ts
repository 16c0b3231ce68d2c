/** The roles a member of a team can hold, from the one who may do everything to the one who only reads. */
export const roles = ["owner", "designer", "reviewer", "builder", "viewer"] as const;

export type Role = (typeof roles)[number];

export function isRole(word: unknown): word is Role {
  return typeof word === "string" && (roles as readonly string[]).includes(word);
}
