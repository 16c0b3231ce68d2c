import { parseArgs } from "node:util";

/** The cluster a command line speaks of: `--name test` is the tests' own, and "app" the one `npm start` uses. */
export function clusterName() {
  const { values } = parseArgs({ options: { name: { type: "string", default: "app" } } });
  if (!/^[a-z][a-z0-9-]{0,30}$/.test(values.name)) {
    console.error("--name takes up to 31 small letters, digits and hyphens, beginning with a letter.");
    process.exit(2);
  }
  return values.name;
}

/** Runs a command to its end; what goes wrong is told in words, not as a stack. */
export async function command(work) {
  try {
    await work();
  } catch (error) {
    console.error(error.message);
    process.exitCode = 1;
  }
}
