import { spawn } from "node:child_process";
import { once } from "node:events";
import { existsSync } from "node:fs";
import { join } from "node:path";
import { serverArguments } from "../../src/run/serverCommand.mjs";

export interface RunningApp {
  /** Where it listens, without a closing slash. */
  url: string;
  pid: number;
  /** All it has printed so far. */
  output(): string;
  /** Ends it as Ctrl-C would, and returns its exit code. */
  stop(): Promise<number | null>;
}

const outDir = process.env.OUT_DIR ?? "dist";

/** Starts the built application on a free port, in demo mode against this test file's own database unless told otherwise. */
export async function startApp(settings: Record<string, string> = {}): Promise<RunningApp> {
  if (!existsSync(join(outDir, "run", "serve.mjs")))
    throw new Error(`There is no build in ${outDir}: npm run build makes one.`);
  // Told that it is being tested, the sign-in would leave out its checks of where a request comes from.
  const { PUBLIC_URL: _, NODE_ENV: __, TEST: ___, ...inherited } = process.env;
  const child = spawn(process.execPath, serverArguments(outDir), {
    env: { ...inherited, HOST: "127.0.0.1", PORT: "0", OUT_DIR: outDir, ...settings },
    stdio: ["ignore", "pipe", "pipe", "ipc"],
  });
  let printed = "";
  for (const stream of [child.stdout, child.stderr])
    stream?.on("data", (chunk: Buffer) => (printed += chunk.toString()));
  const exited = once(child, "exit") as Promise<[number | null]>;

  const ready = once(child, "message") as Promise<[{ address: string }]>;
  const [first] = await Promise.race([ready, exited]);
  if (first === null || typeof first === "number")
    throw new Error(`The application ended with code ${first}:\n${printed}`);

  return {
    url: first.address,
    pid: child.pid ?? 0,
    output: () => printed,
    async stop() {
      child.kill("SIGTERM");
      const [code] = await exited;
      return code;
    },
  };
}
