import type { Database } from "#lib/db/index.ts";
import { decide, type Action, type Actor, type Target, type Team } from "#lib/policy/index.ts";
import { database } from "./database.ts";
import { notFound, Refusal } from "./errors.ts";

/** What a verb is given besides its input. */
export interface Context {
  db: Database;
  actor: Actor | null;
  now: () => Date;
  /** The origin that links in mails begin with. */
  site: string;
}

export function contextOf(locals: App.Locals): Context {
  return { db: database(), actor: locals.actor, now: () => new Date(), site: locals.site };
}

export type Member = Actor & { team: Team };

export const noSession = () =>
  new Refusal("no-session", "Sign in, then do this again. Nothing was changed; what you typed is still yours to keep.");

/** The signed-in person, acting in a team. */
export function memberOf({ actor }: Pick<Context, "actor">): Member {
  if (!actor) throw noSession();
  if (!actor.team) throw new Refusal("not-allowed", "You belong to no team yet. Ask to be invited, or make a team.");
  return { ...actor, team: actor.team };
}

/** Lets the action pass or throws. Work of another team looks as if it did not exist. */
export function authorize({ actor }: Pick<Context, "actor">, action: Action, target: Target): void {
  const decision = decide(actor, action, target);
  if (decision.allowed) return;
  switch (decision.reason) {
    case "no-session":
      throw noSession();
    case "no-team":
    case "other-team":
      throw notFound();
    case "role":
      throw new Refusal(
        "not-allowed",
        `As ${actor?.role ?? "a guest"} you may not do this. Ask an owner of ${actor?.team?.name ?? "the team"} for another role. Nothing was changed.`,
      );
    case "own-work":
      throw new Refusal("not-allowed", "Nobody reviews their own work. Ask another reviewer. Nothing was changed.");
    case "others-work":
      throw new Refusal("not-allowed", "Only the person who wrote this may change it. Nothing was changed.");
  }
}
