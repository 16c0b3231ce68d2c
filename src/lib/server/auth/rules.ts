import { isRole, roles } from "#lib/policy/index.ts";
import { APIError } from "better-auth/api";

const refuse = (message: string) => new APIError("BAD_REQUEST", { message, code: "INVALID_INPUT" });

export function checkPersonName(name: string): string {
  const trimmed = name.trim();
  if (trimmed.length < 1 || trimmed.length > 120) throw refuse("Give a name of 1 to 120 characters.");
  return trimmed;
}

export function checkTeam({ name, slug }: { name?: string | undefined; slug?: string | undefined }) {
  const trimmed = name?.trim();
  if (trimmed !== undefined && (trimmed.length < 1 || trimmed.length > 80)) {
    throw refuse("Give the team a name of 1 to 80 characters.");
  }
  if (slug !== undefined && (slug.length > 80 || !/^[a-z0-9]+(-[a-z0-9]+)*$/.test(slug))) {
    throw refuse("The short name takes small letters, digits and single hyphens, 80 at most.");
  }
  return { ...(trimmed === undefined ? {} : { name: trimmed }), ...(slug === undefined ? {} : { slug }) };
}

/** A member holds exactly one of our roles; better-auth would also take several, or its own. */
export function checkMemberRole(role: string): void {
  if (!isRole(role)) throw refuse(`The role is one of ${roles.join(", ")}.`);
}
