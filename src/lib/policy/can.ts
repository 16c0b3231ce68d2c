import type { Actor } from "./actor.ts";
import { ruleFor, type Action } from "./matrix.ts";

/** What the action is done to: whose it is, and who made it where that matters. */
export interface Target {
  teamId: string;
  madeBy?: string | null;
}

export type Decision =
  | { allowed: true }
  | { allowed: false; reason: "no-session" | "no-team" | "other-team" | "role" | "own-work" | "others-work" };

const no = (reason: Extract<Decision, { allowed: false }>["reason"]): Decision => ({ allowed: false, reason });

/** Decides, and says why not: the server answers "not found" for another team's work and "not allowed" for a role. */
export function decide(actor: Actor | null, action: Action, target: Target): Decision {
  if (!actor) return no("no-session");
  if (!actor.team || !actor.role) return no("no-team");
  if (actor.team.id !== target.teamId) return no("other-team");
  const rule = ruleFor(action);
  if (!rule.roles.includes(actor.role)) return no("role");
  const own = target.madeBy === actor.userId;
  if (rule.neverOnesOwn && own) return no("own-work");
  if (rule.onlyOnesOwn && !own) return no("others-work");
  return { allowed: true };
}

export function can(actor: Actor | null, action: Action, target: Target): boolean {
  return decide(actor, action, target).allowed;
}
