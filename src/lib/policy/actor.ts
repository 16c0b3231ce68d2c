import type { Role } from "./roles.ts";

export interface Team {
  id: string;
  name: string;
  slug: string;
}

/** A signed-in person, and the team and role under which they act in this request. */
export interface Actor {
  userId: string;
  name: string;
  email: string;
  team: Team | null;
  role: Role | null;
}
