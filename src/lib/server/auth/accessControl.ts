import type { actions } from "#lib/policy/index.ts";
import { ruleFor, type Role } from "#lib/policy/index.ts";
import { createAccessControl } from "better-auth/plugins/access";

// What better-auth's own routes ask for, in its words, and the row of our matrix that decides it.
const statement = {
  organization: ["update", "delete"],
  member: ["create", "update", "delete"],
  invitation: ["create", "cancel"],
  team: [],
  ac: ["read"],
} as const;

export const accessControl = createAccessControl(statement);

function permissionsOf(role: Role) {
  const may = (action: (typeof actions)[number]) => ruleFor(action).roles.includes(role);
  return accessControl.newRole({
    organization: may("team.rename") ? ["update"] : [],
    member: may("team.changeRoles") ? ["create", "update", "delete"] : [],
    invitation: may("team.invite") ? ["create", "cancel"] : [],
    ac: may("team.read") ? ["read"] : [],
  });
}

export const teamRoles = {
  owner: permissionsOf("owner"),
  designer: permissionsOf("designer"),
  reviewer: permissionsOf("reviewer"),
  builder: permissionsOf("builder"),
  viewer: permissionsOf("viewer"),
} satisfies Record<Role, unknown>;
