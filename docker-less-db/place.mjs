// Where a cluster's files lie, and as which user PostgreSQL runs. PostgreSQL refuses to run as root, so root hands it to
// the `postgres` user, who may not be allowed to enter the checkout.
import { spawnSync } from "node:child_process";
import { createHash } from "node:crypto";
import { chmodSync, existsSync, mkdirSync, readdirSync, readFileSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";

export const checkout = dirname(dirname(fileURLToPath(import.meta.url)));
export const stateFolder = join(checkout, ".clatterbench");

export function ensureStateFolder() {
  if (!existsSync(stateFolder)) {
    mkdirSync(stateFolder, { recursive: true });
    // Whatever the umask: the user PostgreSQL runs as must pass through, and needs to list nothing.
    chmodSync(stateFolder, 0o711);
  }
  return stateFolder;
}

const runningAsRoot = process.getuid?.() === 0;

/** The account PostgreSQL runs under: `null` means the one this process already has. */
export function serverAccount() {
  if (!runningAsRoot) return null;
  const entry = readFileSync("/etc/passwd", "utf8")
    .split("\n")
    .map((line) => line.split(":"))
    .find(([name]) => name === "postgres");
  if (!entry) throw new Error("PostgreSQL does not run as root, and this machine has no user named postgres.");
  return { uid: Number(entry[2]), gid: Number(entry[3]), home: entry[5] ?? "/var/lib/postgresql" };
}

/** Runs one of PostgreSQL's programs to its end under the right account, in a folder every account may enter. */
export function runAs(account, program, args, { env = {}, quiet = false } = {}) {
  const inherited = Object.fromEntries(Object.entries(process.env).filter(([name]) => !name.startsWith("PG")));
  return spawnSync(program, args, {
    cwd: "/",
    encoding: "utf8",
    // A server started through a pipe keeps it open, and the caller would wait for ever.
    stdio: quiet ? "ignore" : ["ignore", "pipe", "pipe"],
    env: { ...inherited, LC_ALL: "C", ...(account ? { HOME: account.home } : {}), ...env },
    ...(account ? { uid: account.uid, gid: account.gid } : {}),
  });
}

/** The folder a new cluster goes to: beside the checkout's other state where the account may enter, else in its home. */
export function clusterFolder(name, account) {
  const inCheckout = join(ensureStateFolder(), `postgres-${name}`);
  if (!account || runAs(account, "test", ["-x", stateFolder]).status === 0) return inCheckout;
  const key = createHash("sha256").update(checkout).digest("hex").slice(0, 12);
  return join(account.home, `clatterbench-${key}`, `postgres-${name}`);
}

/** The folders holding PostgreSQL's programs, newest version first. */
export function programFolders() {
  const packaged = "/usr/lib/postgresql";
  const versions = existsSync(packaged) ? readdirSync(packaged) : [];
  const folders = versions.sort((a, b) => Number(b) - Number(a)).map((version) => join(packaged, version, "bin"));
  const onPath = (process.env.PATH ?? "").split(":").filter(Boolean);
  return [...folders, ...onPath].filter(
    (folder) => existsSync(join(folder, "initdb")) && existsSync(join(folder, "pg_ctl")),
  );
}
