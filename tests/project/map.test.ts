import { existsSync, readFileSync } from "node:fs";
import { expect, test } from "vitest";

// A path in a document is written in backticks and holds a slash, or ends like a file of ours.
const named = /`((?:\.?[\w-]+\/)[\w./-]*|[\w.-]+\.(?:md|ts|mjs|js|json))`/g;

test.each(["README.md", "DEVELOPERS.md", "docker-less-db/README.md"])("%s names only paths that exist", (document) => {
  const paths = [...readFileSync(document, "utf8").matchAll(named)].map(([, path]) => path ?? "");
  // What only a running checkout has is not in a fresh one.
  const lasting = paths.filter((path) => !path.startsWith(".clatterbench/") && !path.startsWith("dist/"));
  expect(lasting.length).toBeGreaterThan(0);
  expect(lasting.filter((path) => !existsSync(path))).toEqual([]);
});
