import { createHash, randomBytes } from "node:crypto";

/** 256 random bits in letters that stand in an address or a header as they are. */
export const newSecret = (): string => randomBytes(32).toString("base64url");

/** What is stored of a secret. It is random already, so that a plain hash tells nothing. */
export const hashOfSecret = (secret: string): string => createHash("sha256").update(secret).digest("hex");
