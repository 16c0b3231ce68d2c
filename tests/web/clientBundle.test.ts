import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { expect, test } from "vitest";

const client = join(process.env.OUT_DIR ?? "dist", "client");
const scripts = readdirSync(client, { recursive: true, encoding: "utf8" })
  .filter((name) => /\.m?js$/.test(name))
  .map((name) => ({ name, text: readFileSync(join(client, name), "utf8") }));

// Words that survive minification, and the server code each is taken from.
const serverOnly = {
  "drizzle:Name": "node_modules/drizzle-orm/table.utils.js",
  CONNECTION_DESTROYED: "node_modules/postgres/src/connection.js",
  BETTER_AUTH_SECRET: "node_modules/better-auth/dist/context/create-context.mjs",
  DATABASE_URL: "src/lib/server/env.ts",
};

test("the browser is sent scripts", () => {
  expect(scripts.length).toBeGreaterThan(0);
});

test.each(Object.entries(serverOnly))("no script sent to the browser holds %s of %s", (word, origin) => {
  // A word that its origin no longer holds would be looked for in vain.
  expect(readFileSync(origin, "utf8")).toContain(word);
  expect(scripts.filter(({ text }) => text.includes(word)).map(({ name }) => name)).toEqual([]);
});
