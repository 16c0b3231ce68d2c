import { createHmac, timingSafeEqual } from "node:crypto";
import { settings } from "../env.ts";

const sign = (userId: string) =>
  createHmac("sha256", settings().BETTER_AUTH_SECRET).update(`mentions unsubscribe ${userId}`).digest("base64url");

/** Stands in the address of a mail: whoever holds it may stop these mails to one person, and nothing else. */
export const unsubscribeToken = (userId: string): string => `${userId}.${sign(userId)}`;

/** The person a token is of, or null where it is none of ours. */
export function personOfToken(token: string): string | null {
  const [userId = "", signature = ""] = token.split(".");
  const [given, right] = [Buffer.from(signature), Buffer.from(sign(userId))];
  return given.length === right.length && timingSafeEqual(given, right) ? userId : null;
}
