import { execFile } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";
import { expect, it } from "vitest";
import { expectRelative } from "./approx.ts";

export interface ScipyDocument<Given, Figures> {
  versions: Record<string, string>;
  cases: { given: Given & { id: string }; figures: Figures }[];
}

const path = (name: string) => fileURLToPath(new URL(`../reference/${name}`, import.meta.url));

/** The committed figures of `tests/reference/<name>.json`. */
export const committed = <Given, Figures>(name: string): ScipyDocument<Given, Figures> =>
  JSON.parse(readFileSync(path(`${name}.json`), "utf8")) as ScipyDocument<Given, Figures>;

/** Debian's own Python, for its scipy package installs there and nowhere else. */
const python = "/usr/bin/python3";
const hasScipy = existsSync(python) && existsSync("/usr/lib/python3/dist-packages/scipy");

/** Runs `tests/reference/<name>.py` again and compares every figure with the committed one, relative. */
export function itGivesTheCommittedFiguresAgain(name: string, tolerance: number): void {
  if (!hasScipy) console.warn(`python3-scipy is not installed: the committed figures of ${name} are not recomputed.`);
  it.runIf(hasScipy)(
    `gives the figures of ${name}.json again`,
    async () => {
      const { stdout } = await promisify(execFile)(python, ["-W", "ignore", path(`${name}.py`)]);
      const again = JSON.parse(stdout) as ScipyDocument<object, unknown>;
      const before = committed<object, unknown>(name);
      expect(again.cases.map(({ given }) => given)).toEqual(before.cases.map(({ given }) => given));
      for (const [i, { given, figures }] of again.cases.entries())
        expectAlike(figures, before.cases[i]!.figures, tolerance, given.id);
    },
    120_000,
  );
}

function expectAlike(got: unknown, wanted: unknown, tolerance: number, what: string): void {
  if (typeof wanted === "number") return expectRelative(got, wanted, tolerance, what);
  if (typeof wanted !== "object" || wanted === null || typeof got !== "object" || got === null)
    return expect(got, what).toEqual(wanted);
  expect(Object.keys(got), what).toEqual(Object.keys(wanted));
  for (const [key, value] of Object.entries(wanted))
    expectAlike((got as Record<string, unknown>)[key], value, tolerance, `${what} ${key}`);
}
