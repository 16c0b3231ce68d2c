// One process at a time: two starts in one checkout must not both create a cluster, install packages or build.
import { closeSync, mkdirSync, openSync, readFileSync, rmSync, writeSync } from "node:fs";
import { dirname } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";

export function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === "EPERM";
  }
}

function take(path) {
  try {
    const file = openSync(path, "wx");
    writeSync(file, String(process.pid));
    closeSync(file);
    return true;
  } catch (error) {
    if (error.code !== "EEXIST") throw error;
    return false;
  }
}

function holder(path) {
  try {
    return Number(readFileSync(path, "utf8"));
  } catch (error) {
    if (error.code === "ENOENT") return undefined;
    throw error;
  }
}

/** Runs `work` while holding the lock file; a lock whose holder has died is taken over. */
export async function withLock(path, work) {
  mkdirSync(dirname(path), { recursive: true });
  let empty = 0;
  while (!take(path)) {
    const pid = holder(path);
    // A lock file is empty for the moment between its creation and the writing of the process id.
    empty = pid === 0 ? empty + 1 : 0;
    if ((pid && !isAlive(pid)) || empty > 20) rmSync(path, { force: true });
    else await sleep(100);
  }
  try {
    return await work();
  } finally {
    rmSync(path, { force: true });
  }
}
