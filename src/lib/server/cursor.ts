import { z } from "zod";
import { Refusal } from "./errors.ts";

const shape = z.tuple([z.string(), z.string(), z.string()]);

export interface PageCursor {
  /** The order of the list it belongs to. */
  order: string;
  /** Value of the sorted column in the last entry of the page before. */
  key: string;
  id: string;
}

export function writePageCursor({ order, key, id }: PageCursor): string {
  return Buffer.from(JSON.stringify([order, key, id])).toString("base64url");
}

function parseLoosely(text: string): unknown {
  try {
    return JSON.parse(Buffer.from(text, "base64url").toString("utf8")) as unknown;
  } catch {
    return undefined;
  }
}

/** Reads a cursor; one that was not given out for this order is refused rather than read as the first page. */
export function readPageCursor(text: string, order: string, isKey: (key: string) => boolean): PageCursor {
  const parsed = shape.safeParse(parseLoosely(text));
  if (!parsed.success || parsed.data[0] !== order || !isKey(parsed.data[1])) {
    throw new Refusal("invalid-input", "This cursor belongs to no page of the list. Begin again without it.", {
      errors: [{ path: "cursor", message: "Give the nextCursor of the page before, in the same order." }],
    });
  }
  const [, key, id] = parsed.data;
  return { order, key, id };
}

export const isMoment = (key: string): boolean => /^\d{4}-\d\d-\d\dT/.test(key) && !Number.isNaN(Date.parse(key));
export const isCount = (key: string): boolean => /^\d{1,9}$/.test(key);
