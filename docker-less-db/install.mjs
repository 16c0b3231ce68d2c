// Debian packages the project needs and a machine may lack: installed by root, named to everyone else.
import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";

export class MissingPackage extends Error {}

let listsAreFresh = false;

function apt(...args) {
  const env = { ...process.env, DEBIAN_FRONTEND: "noninteractive" };
  const { status } = spawnSync("apt-get", ["-q", "-y", ...args], { stdio: ["ignore", "ignore", "inherit"], env });
  return status === 0;
}

/** Installs one Debian package as root, or throws the command that a person who may can run. */
export function installPackage(name, purpose) {
  const sudo = process.getuid?.() === 0 ? "" : "sudo ";
  const command = `${sudo}apt-get update && ${sudo}apt-get install -y --no-install-recommends ${name}`;
  if (!existsSync("/usr/bin/apt-get")) {
    throw new MissingPackage(
      `${purpose} is missing. Install it (Debian's package is called ${name}), then start again.`,
    );
  }
  if (process.getuid?.() !== 0) {
    throw new MissingPackage(
      `${purpose} is missing, and only root may install it. Run this, then start again:\n\n  ${command}\n`,
    );
  }
  console.log(`${purpose} is missing: installing Debian's ${name} …`);
  // Package lists in fresh containers are empty or old, and an install from them fails.
  if (!listsAreFresh) listsAreFresh = apt("update");
  if (!apt("install", "--no-install-recommends", name)) {
    throw new MissingPackage(`${purpose} could not be installed. Run this by hand to see why:\n\n  ${command}\n`);
  }
}
