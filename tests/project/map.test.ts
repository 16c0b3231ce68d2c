import { existsSync, readFileSync } from "node:fs";
import { expect, test } from "vitest";

/** The paths a document names: words in backticks that hold a slash, or end like a file of ours. */
function pathsIn(text: string): string[] {
  const words = [...text.matchAll(/`([^`\n]+)`/g)].flatMap(([, code]) => (code ?? "").split(/\s+/));
  return words.filter((word) => /^\.?[\w-]+(\/[\w.[\]-]*)+$|^[\w.-]+\.(md|ts|mjs|js|json)$/.test(word));
}

test.each(["README.md", "DEVELOPERS.md", "docker-less-db/README.md"])("%s names only paths that exist", (document) => {
  const paths = pathsIn(readFileSync(document, "utf8"));
  // What only a running checkout has is not in a fresh one.
  const lasting = paths.filter((path) => !/^(\.clatterbench|dist)\//.test(path));
  expect(lasting.length).toBeGreaterThan(0);
  expect(lasting.filter((path) => !existsSync(path))).toEqual([]);
});
