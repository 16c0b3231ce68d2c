import { pino, type Logger } from "pino";
import { settings } from "./env.ts";

let made: Logger | undefined;

/** The log of this process. Made at first use, so that a build needs no settings. */
export function log(): Logger {
  made ??= pino({
    name: "clatterbench",
    level: settings().LOG_LEVEL,
    redact: ["*.password", "*.token", "headers.cookie", "headers.authorization"],
  });
  return made;
}
