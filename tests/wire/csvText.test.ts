import { expect, test } from "vitest";
import { csvText } from "#lib/wire/csvText.ts";

test("csvText quotes what needs it and ends lines as RFC 4180 does", () => {
  expect(
    csvText([
      ["Voice", "Stages"],
      ['Hat, "long"', 3],
      ["two\nlines", -1.5],
    ]),
  ).toBe('Voice,Stages\r\n"Hat, ""long""",3\r\n"two\nlines",-1.5\r\n');
});

test("csvText keeps a spreadsheet from taking a name for a formula, and leaves numbers alone", () => {
  expect(csvText([["=1+1", "-9", "@sum", -9]])).toBe("'=1+1,'-9,'@sum,-9\r\n");
});
