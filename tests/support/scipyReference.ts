import { execFile } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";

/** What a script of `tests/reference` printed: for each case what was given and what came out. */
export interface ScipyReference<Given, Figures> {
  "made by": string;
  versions: Record<string, string>;
  cases: readonly { given: Given & { id: string }; figures: Figures }[];
}

const pathOf = (name: string) => fileURLToPath(new URL(`../reference/${name}`, import.meta.url));
const python = "/usr/bin/python3";

/** Whether the scripts can be rerun here; where not, the committed figures are used, and the test run says so. */
export const hasScipy = existsSync(python) && existsSync("/usr/lib/python3/dist-packages/scipy");

/** The committed figures of `tests/reference/<name>.json`. */
export function scipyReference<Given, Figures>(name: string): ScipyReference<Given, Figures> {
  return JSON.parse(readFileSync(pathOf(`${name}.json`), "utf8")) as ScipyReference<Given, Figures>;
}

/** Runs `tests/reference/<name>.py` anew. */
export async function rerunScipy<Given, Figures>(name: string): Promise<ScipyReference<Given, Figures>> {
  const { stdout } = await promisify(execFile)(python, ["-W", "ignore", pathOf(`${name}.py`)], {
    maxBuffer: 64 * 1024 * 1024,
  });
  return JSON.parse(stdout) as ScipyReference<Given, Figures>;
}
