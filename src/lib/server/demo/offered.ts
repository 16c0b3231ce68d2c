import { roles, type Role } from "#lib/policy/index.ts";
import { settings } from "../env.ts";

/** The accounts that the sign-in page offers: one for each role in a demo, none anywhere else. */
export function offeredAccounts(): { role: Role; email: string; password: string }[] {
  if (settings().CLATTERBENCH_MODE !== "demo") return [];
  return roles.map((role) => ({ role, email: `${role}@demo.test`, password: "clatter-demo-1" }));
}
