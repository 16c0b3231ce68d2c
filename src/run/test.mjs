// `npm test`: everything that is checked, from a clean clone to a closing line. Works beside a running `npm start`, with a
// database cluster and a build of its own. Plain Node.js, since it runs before any package is there.
import { spawnSync } from "node:child_process";
import { existsSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { clusterIsHeld, releaseCluster, resetCluster, startCluster } from "../../docker-less-db/cluster.mjs";
import { installPackage } from "../../docker-less-db/install.mjs";
import { withLock } from "../../docker-less-db/lock.mjs";
import { checkout, ensureStateFolder } from "../../docker-less-db/place.mjs";
import { checkNode, ensureBuild, ensurePackages, run } from "./prepare.mjs";

const cluster = "test";
const outDir = ".clatterbench/test-dist";
const browsers = [process.env.CHROMIUM, "/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];

const stopping = new AbortController();
for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, () => stopping.abort());

const total = { passed: 0, failed: 0 };

function count(passed, failed) {
  total.passed += passed;
  total.failed += failed;
}

/** A step that either holds or does not: it counts as one test. */
async function step(title, work) {
  stopping.signal.throwIfAborted();
  console.log(`\n── ${title}`);
  try {
    await work();
    count(1, 0);
    return true;
  } catch (error) {
    console.error(error.message);
    count(0, 1);
    return false;
  }
}

/** Runs some of vitest's projects; its own report says what passed. */
async function vitest(title, ...projects) {
  stopping.signal.throwIfAborted();
  console.log(`\n── ${title}`);
  const report = join(ensureStateFolder(), `results-${projects.join("-")}.json`);
  rmSync(report, { force: true });
  const args = [
    join("node_modules", "vitest", "vitest.mjs"),
    "run",
    ...projects.map((project) => `--project=${project}`),
    "--reporter=default",
    "--reporter=json",
    `--outputFile.json=${report}`,
  ];
  const outcome = await run(process.execPath, args, { signal: stopping.signal, env: { OUT_DIR: outDir } }).catch(
    (error) => error,
  );
  const results = existsSync(report) ? JSON.parse(readFileSync(report, "utf8")) : undefined;
  // A file that does not even load has no test that could fail, and neither has a run that broke down.
  const unloaded =
    results?.testResults.filter((file) => file.status === "failed" && file.assertionResults.length === 0).length ?? 0;
  const failed = (results?.numFailedTests ?? 0) + unloaded;
  count(results?.numPassedTests ?? 0, outcome instanceof Error ? Math.max(failed, 1) : failed);
}

function ensureScipy() {
  const python = "/usr/bin/python3";
  const isThere = () => spawnSync(python, ["-c", "import scipy.signal"], { stdio: "ignore" }).status === 0;
  if (isThere()) return;
  try {
    installPackage("python3-scipy", "scipy, which checks the curves a second time,");
  } catch (error) {
    console.log(`${error.message}\nThe comparison with scipy is left out of this run.`);
  }
}

async function test() {
  checkNode();
  await ensurePackages(stopping.signal);
  if (!browsers.some((path) => path && existsSync(path))) installPackage("chromium", "Chromium");
  ensureScipy();

  // What an interrupted run left behind is not worth keeping.
  if (!clusterIsHeld(cluster)) await resetCluster(cluster);
  await startCluster(cluster);

  const inherit = { signal: stopping.signal };
  const tool = (...path) => join("node_modules", ...path);
  const node = (title, ...args) => step(title, () => run(process.execPath, args, { ...inherit, label: title }));
  await node("Types", tool("astro", "astro.js"), "check", "--minimumFailingSeverity", "error");
  await node("Lint", tool("eslint", "bin", "eslint.js"), ".", "--max-warnings", "0");
  await node("Formatting", tool("prettier", "bin", "prettier.cjs"), "--check", "--log-level", "warn", ".");
  await vitest("Units", "unit");
  if (!(await step("Build", () => ensureBuild(outDir, stopping.signal)))) return;
  await vitest("Server, on a real PostgreSQL", "server", "web");
  await vitest("Journeys in Chromium", "e2e");
}

try {
  await withLock(join(ensureStateFolder(), "test-run.lock"), test);
} catch (error) {
  if (stopping.signal.aborted) console.error("Interrupted.");
  else console.error(error.message);
  count(0, 1);
} finally {
  await releaseCluster(cluster);
}
console.log(`\n${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed === 0 ? 0 : 1;
