import type { Role } from "#lib/policy/index.ts";
import { settings } from "../env.ts";
import { demoPassword, demoPeople } from "./accounts.ts";

/** The accounts that the sign-in page offers: one for each role in a demo, none anywhere else. */
export function offeredAccounts(): { role: Role; email: string; password: string }[] {
  if (settings().CLATTERBENCH_MODE !== "demo") return [];
  return demoPeople.map(({ role, email }) => ({ role, email, password: demoPassword }));
}
