import { readFileSync } from "node:fs";
import { join } from "node:path";
import { gzipSync } from "node:zlib";

const client = join(process.env.OUT_DIR ?? "dist", "client");
const readScript = (address: string) => readFileSync(join(client, address), "utf8");

/** Addresses of the scripts that `from` imports: at once, or when it comes to it. */
function importsOf(from: string, code: string) {
  const found = (pattern: RegExp) =>
    [...code.matchAll(pattern)].map(([, , file]) => new URL(file!, `http://built${from}`).pathname);
  return {
    atOnce: found(/\b(?:from|import)\s*(["'`])([^"'`]+\.js)\1/g),
    later: found(/\bimport\(\s*(["'`])([^"'`]+\.js)\1/g),
    // A worker's script, which Vite names by its whole address.
    workers: found(/\bnew Worker\([^)]*?(["'`])(\/_astro\/[^"'`]+\.js)\1/g),
  };
}

/** The scripts that a page's HTML asks for by itself: its islands, what draws them, and its own. */
export function scriptsOf(html: string): string[] {
  const named = html.matchAll(
    /\b(?:component-url|renderer-url|before-hydration-url|src|href)="(\/_astro\/[^"]+\.js)"/g,
  );
  return [...new Set([...named].map(([, address]) => address!))];
}

/** These scripts and all that they import. With `later`, also what is fetched only when it is wanted. */
export function reached(entries: Iterable<string>, later: (script: string) => boolean = () => false): Set<string> {
  const seen = new Set<string>();
  const follow = (script: string) => {
    if (seen.has(script)) return;
    seen.add(script);
    const imports = importsOf(script, readScript(script));
    imports.atOnce.forEach(follow);
    [...imports.later, ...imports.workers].filter(later).forEach(follow);
  };
  for (const entry of entries) follow(entry);
  return seen;
}

/** What the browser fetches of them, compressed as the server sends it. */
export const gzipSize = (scripts: Iterable<string>) =>
  [...scripts].reduce((sum, script) => sum + gzipSync(readScript(script)).length, 0);

/** A chunk that is fetched when a network is asked for. */
export interface LoadedChunk {
  kind: string;
  /** Absent where the chunk is a whole kind. */
  topology?: string;
  script: string;
}

/** The chunks of every kind and topology: from the tables that the built loaders keep, in page and worker alike. */
export function loadedChunks(scripts: Iterable<string>): LoadedChunk[] {
  const entry =
    /(["'`])\.\/([a-z0-9-]+)(?:\/topologies\/([\w-]+))?(?:\/index)?\.ts\1\s*:.{0,60}?import\(\s*(["'`])([^"'`]+\.js)\4/g;
  return [...scripts].flatMap((from) =>
    [...readScript(from).matchAll(entry)].map(([, , kind, topology, , file]): LoadedChunk => {
      const script = new URL(file!, `http://built${from}`).pathname;
      return { kind: kind!, script, ...(topology !== undefined && { topology }) };
    }),
  );
}
