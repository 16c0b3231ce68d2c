import { openApiDocument } from "#lib/wire/openapi.ts";
import { routes } from "#lib/wire/routes/index.ts";
import { readdirSync, readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";

const folder = new URL("../../src/pages/api/", import.meta.url);

/** Route files by the path they serve, in the notation of OpenAPI. */
const files = readdirSync(folder, { recursive: true, encoding: "utf8" })
  .filter((file) => file.endsWith(".ts"))
  .map((file) => ({
    file,
    path: `/api/${file}`
      .replace(/\.ts$/, "")
      .replace(/\/index$/, "")
      .replace(/\[([^\].]+)\]/g, "{$1}"),
    source: readFileSync(new URL(file, folder), "utf8"),
  }));

// The catch-all answers 404; the sign-in is better-auth's own, whose part that scripts need is described by hand.
const catchAlls = ["/api/[...unknown]", "/api/auth/[...all]"];

const served = files
  .filter(({ path }) => !catchAlls.includes(path))
  .flatMap(({ path, source }) =>
    [...source.matchAll(/^export const (GET|POST|PUT|PATCH|DELETE)\b/gm)].map(([, method]) => `${method} ${path}`),
  );

const described = routes
  .filter(({ path }) => !path.startsWith("/api/auth/"))
  .map(({ method, path }) => `${method} ${path}`);

// A described path may spell out a variable of its file, as /api/kinds/band-pass does.
const matches = (route: string, file: string) =>
  new RegExp(`^${file.replace(/[.*+?^$()|[\]\\]/g, "\\$&").replace(/\{[^}]+\}/g, "[^/]+")}$`).test(route);

describe("the description of the interface", () => {
  test.each(served)("holds what a file serves: %s", (route) => {
    expect(described.some((candidate) => matches(candidate, route))).toBe(true);
  });

  test.each(described)("holds nothing that no file serves: %s", (route) => {
    expect(served.some((file) => matches(route, file))).toBe(true);
  });

  test.each(files.map(({ file, source }) => ({ file, source })))("$file answers every method", ({ source }) => {
    expect(source).toMatch(/^export const ALL\b/m);
  });

  test("names each operation once", () => {
    const ids = routes.map(({ operationId }) => operationId);
    expect(new Set(ids).size).toBe(ids.length);
  });

  test("names every variable of each path", () => {
    for (const { path, parameters } of routes) {
      const variables = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name);
      expect(Object.keys(parameters ?? {}), path).toEqual(variables);
    }
  });

  test("is OpenAPI 3.1, and every reference in it leads somewhere", () => {
    const document = openApiDocument(routes, "1.2.3");
    expect(document).toMatchObject({ openapi: "3.1.0", info: { version: "1.2.3" } });
    const references = [...JSON.stringify(document).matchAll(/"\$ref":"#\/([^"]+)"/g)].map(([, path]) => path ?? "");
    expect(references.length).toBeGreaterThan(0);
    for (const reference of new Set(references)) {
      const target = reference
        .split("/")
        .reduce<unknown>((at, key) => (at as Record<string, unknown>)?.[key], document);
      expect(target, reference).toBeDefined();
    }
  });
});
