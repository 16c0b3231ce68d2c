import { join } from "node:path";

/**
 * What Node.js is given to run the built server. The heap's bound is far above what the server needs (about 40 MB in use);
 * without one V8 lets garbage grow with the machine's memory before it collects.
 */
export const serverArguments = (outDir) => [
  "--enable-source-maps",
  "--max-old-space-size=512",
  join(outDir, "run", "serve.mjs"),
];
