import { describe, expect, test } from "vitest";
import { safeNextPath, signInPath } from "#lib/wire/nextPath.ts";

describe("safeNextPath keeps paths of this site", () => {
  test.each(["/voices", "/voices/voi_1/stages/stg_2", "/calculators/band-pass?voice=voi_1#parts"])("%s", (path) => {
    expect(safeNextPath(path)).toBe(path);
  });
});

describe("safeNextPath leads nowhere else", () => {
  test.each([
    ["nothing", null],
    ["empty", ""],
    ["another site", "https://elsewhere.test/voices"],
    ["a site without a scheme", "//elsewhere.test"],
    ["a backslash that browsers read as a slash", "/\\elsewhere.test"],
    ["a tab that browsers drop", "/\t/elsewhere.test"],
    ["a script", "javascript:alert(1)"],
  ])("%s", (_what, next) => {
    expect(safeNextPath(next)).toBe("/voices");
  });
});

test("signInPath comes back to the page with its query", () => {
  const path = signInPath(new URL("http://bench.test/calculators/band-pass?voice=a&x=1 2"));
  const next = new URL(path, "http://bench.test").searchParams.get("next");
  expect(next).toBe("/calculators/band-pass?voice=a&x=1%202");
  expect(safeNextPath(next)).toBe(next);
});
