import { pino } from "pino";

export const log = pino({
  name: "clatterbench",
  level: "info",
  redact: ["*.password", "*.token", "headers.cookie", "headers.authorization"],
});
