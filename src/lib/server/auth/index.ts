import { database } from "../database.ts";
import { settings } from "../env.ts";
import { mailer } from "../mail/index.ts";
import { createAuth, type Auth } from "./createAuth.ts";

let made: Auth | undefined;

/** The sign-in of this process. Made at first use, so that a build needs neither settings nor database. */
export function auth(): Auth {
  made ??= createAuth({ db: database(), mailer, settings: settings() });
  return made;
}
