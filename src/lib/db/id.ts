import { randomBytes } from "node:crypto";

const alphabet = "0123456789abcdefghjkmnpqrstvwxyz";

/** An opaque id such as `voi_7k2m…`: 100 random bits, with a prefix that tells a reader of a log what it names. */
export function newId(prefix: string): string {
  let text = "";
  for (const byte of randomBytes(20)) text += alphabet[byte & 31];
  return `${prefix}_${text}`;
}
