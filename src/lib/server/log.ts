import { pino } from "pino";

export const log = pino({
  name: "clatterbench",
  level: process.env.LOG_LEVEL ?? "info",
  redact: ["*.password", "*.token", "headers.cookie", "headers.authorization"],
});
