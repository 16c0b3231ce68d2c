// Who needs a cluster to be up: one file per process, so that the last to leave stops it and a killed one is not counted.
import { existsSync, mkdirSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { isAlive } from "./lock.mjs";
import { ensureStateFolder } from "./place.mjs";

export function holdersOf(name) {
  const folder = join(ensureStateFolder(), `database-${name}.holders`);
  const kept = join(folder, "kept");
  const own = join(folder, String(process.pid));
  const mark = (path) => {
    mkdirSync(folder, { recursive: true });
    writeFileSync(path, "");
  };
  return {
    add: () => mark(own),
    /** Started by hand: stays up until it is stopped by hand. */
    keep: () => mark(kept),
    remove: () => rmSync(own, { force: true }),
    clear: () => rmSync(folder, { recursive: true, force: true }),
    any: () => {
      if (existsSync(kept)) return true;
      if (!existsSync(folder)) return false;
      return readdirSync(folder).some((entry) => isAlive(Number(entry)));
    },
  };
}
