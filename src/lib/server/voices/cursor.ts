import { z } from "zod";
import { Refusal } from "../errors.ts";

const cursorSchema = z.tuple([z.enum(["updated", "created", "name"]), z.string(), z.string()]);

export interface Cursor {
  sort: "updated" | "created" | "name";
  /** Value of the sorted column in the last entry of the page before. */
  key: string;
  id: string;
}

export function writeCursor({ sort, key, id }: Cursor): string {
  return Buffer.from(JSON.stringify([sort, key, id])).toString("base64url");
}

function parseLoosely(text: string): unknown {
  try {
    return JSON.parse(Buffer.from(text, "base64url").toString("utf8")) as unknown;
  } catch {
    return undefined;
  }
}

/** Reads a cursor; one that was not given out for this order is refused rather than read as the first page. */
export function readCursor(text: string, sort: Cursor["sort"]): Cursor {
  const parsed = cursorSchema.safeParse(parseLoosely(text));
  const usable =
    parsed.success && parsed.data[0] === sort && (sort === "name" || !Number.isNaN(Date.parse(parsed.data[1])));
  if (!parsed.success || !usable) {
    throw new Refusal("invalid-input", "This cursor belongs to no page of the list. Begin again without it.", {
      errors: [{ path: "cursor", message: "Give the nextCursor of the page before, in the same order." }],
    });
  }
  const [, key, id] = parsed.data;
  return { sort, key, id };
}
