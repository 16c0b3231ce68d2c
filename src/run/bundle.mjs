// Bundles the server round the application, so that it runs on plain Node.js. Through a TypeScript loader every import of
// the application, its routes' among them, would pass the loader's hooks.
import { join } from "node:path";
import { build } from "esbuild";

await build({
  // The server, and what the threads of its pool run.
  entryPoints: ["serve", "calculate"].map((name) => join("src", "run", `${name}.ts`)),
  outdir: join(process.env.OUT_DIR || "dist", "run"),
  outExtension: { ".js": ".mjs" },
  bundle: true,
  platform: "node",
  target: "node20",
  format: "esm",
  packages: "external",
  // The library's and the server's own modules are named through the package's import map, which is no package.
  alias: { "#lib": join(process.cwd(), "src", "lib") },
  sourcemap: true,
  logLevel: "warning",
});
