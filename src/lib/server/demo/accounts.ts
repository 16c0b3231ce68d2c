import type { Role } from "#lib/policy/index.ts";
import { settings } from "../env.ts";

export interface DemoAccount {
  email: string;
  password: string;
  role: Role;
  /** What the role may do, in a few words. */
  may: string;
}

const password = "clatter-demo-1";
const account = (role: Role, may: string): DemoAccount => ({ email: `${role}@demo.test`, password, role, may });

/** The accounts that a demo opens with; none anywhere else. */
export function demoAccounts(): DemoAccount[] {
  if (settings().CLATTERBENCH_MODE !== "demo") return [];
  return [
    account("owner", "Everything, the team included"),
    account("designer", "Edits stages and makes revisions"),
    account("reviewer", "Reads working copies, releases or returns revisions"),
    account("builder", "Reads working copies, keeps build records"),
    account("viewer", "Reads what has been released"),
  ];
}
