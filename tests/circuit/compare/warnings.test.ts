import type { StageWarning } from "#lib/circuit/index.ts";
import { changedWarnings } from "#lib/circuit/compare/warnings.ts";
import { expect, test } from "vitest";

const warning = (stage: string, code: string, value = 1, limit = 2): StageWarning => ({
  ...{ stage, code, value, limit, severity: "caution", message: `${code} ${value}`, unit: "V" },
});

test("a warning whose figure moved has neither come nor gone", () => {
  expect(changedWarnings([warning("a", "clip", 11)], [warning("a", "clip", 12)])).toEqual({ gone: [], new: [] });
});

test("a warning whose limit moved too is still the same", () => {
  expect(changedWarnings([warning("a", "clip", 1, 2)], [warning("a", "clip", 1, 3)])).toEqual({ gone: [], new: [] });
});

test("the same code in another stage is another warning", () => {
  const [old, fresh] = [warning("a", "clip"), warning("b", "clip")];
  expect(changedWarnings([old], [fresh])).toEqual({ gone: [old], new: [fresh] });
});

test("of several with one code, those of one limit belong together", () => {
  const [low, high, other] = [warning("a", "range", 1, 10), warning("a", "range", 9, 20), warning("a", "range", 3, 30)];
  expect(changedWarnings([low, high], [high])).toEqual({ gone: [low], new: [] });
  expect(changedWarnings([low], [low, other])).toEqual({ gone: [], new: [other] });
});
