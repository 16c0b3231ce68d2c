import { readFileSync } from "node:fs";

/** A case of `tests/reference/published.json`; the names inside are the source's own. */
export interface PublishedCase {
  id: string;
  given: Record<string, unknown>;
  expect: Record<string, unknown>;
  rel_tol: number;
  source: { title: string; section?: string; how_known: string };
}

const folder = new URL("../reference/", import.meta.url);
const read = (name: string): unknown => JSON.parse(readFileSync(new URL(name, folder), "utf8"));

const cases = read("published.json") as PublishedCase[];

export function published(id: string): PublishedCase {
  const found = cases.find((one) => one.id === id);
  if (!found) throw new Error(`published.json has no case ${id}`);
  return found;
}

const values = read("worked.json") as Record<string, { value: number; unit: string }>;

/** A worked value, in the unit its key names. */
export function worked(key: string): number {
  const found = values[key];
  if (!found) throw new Error(`worked.json has no value ${key}`);
  return found.value;
}

export const workedKeys = (prefix: string): string[] => Object.keys(values).filter((key) => key.startsWith(prefix));
