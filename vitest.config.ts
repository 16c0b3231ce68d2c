import { defineConfig } from "vitest/config";

const folders = (...names: string[]) => names.map((name) => `tests/${name}/**/*.test.{ts,tsx}`);

export default defineConfig({
  test: {
    projects: [
      {
        // Needs nothing: pure functions, and the repository's own files.
        test: {
          name: "unit",
          include: folders(
            "circuit",
            "kinds",
            "policy",
            "wire",
            "reference",
            "golden",
            "client",
            "components",
            "project",
          ),
          testTimeout: 20_000,
        },
      },
      {
        // Calls verbs and the database directly, each file on a PostgreSQL database of its own.
        test: {
          name: "server",
          include: folders("server"),
          globalSetup: ["tests/support/templateDatabase.ts"],
          setupFiles: ["tests/support/ownDatabase.ts"],
          testTimeout: 20_000,
          hookTimeout: 60_000,
        },
      },
      {
        // Talks HTTP to the built application. Needs a build: npm test makes one.
        test: {
          name: "web",
          include: folders("web"),
          globalSetup: ["tests/support/templateDatabase.ts"],
          setupFiles: ["tests/support/ownDatabase.ts"],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        // Drives Chromium against the built application, one journey at a time.
        test: {
          name: "e2e",
          include: folders("e2e"),
          globalSetup: ["tests/support/templateDatabase.ts"],
          setupFiles: ["tests/support/ownDatabase.ts"],
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
