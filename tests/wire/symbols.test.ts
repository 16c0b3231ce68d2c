import { expect, test } from "vitest";
import { cutAtSubscripts, cutAtSymbols, setSymbols } from "#lib/wire/symbols.ts";

test.each([
  ["R_F is 2 MΩ.", ["R_F"]],
  ["Q·f_0/f_t and |H_0|, V_T+ and V_T−, t_60,max", ["f_0", "f_t", "|H_0|", "V_T+", "V_T−", "t_60,max"]],
  ["R_A, then R_B+R_C", ["R_A", "R_B", "R_C"]],
  ["(V_pk/2V_T)², V_BE,sat and t_w,1/2", ["V_pk", "V_T", "V_BE,sat", "t_w,1/2"]],
  ["scipy's solve_ivp knows no symbol", []],
])("%s", (text, symbols) => {
  const pieces = cutAtSymbols(text);
  expect(pieces.filter((_, i) => i % 2 === 1)).toEqual(symbols);
  expect(pieces.join("")).toBe(text);
});

test("a symbol is cut at its subscript", () => {
  expect(cutAtSubscripts("t_60,max")).toEqual(["t", "60,max", ""]);
  expect(cutAtSubscripts("t_w,1/2")).toEqual(["t", "w,1/2", ""]);
  expect(cutAtSubscripts("|H_0|")).toEqual(["|H", "0", "|"]);
  expect(cutAtSubscripts("V_pk(1)")).toEqual(["V", "pk", "(1)"]);
});

test("written HTML keeps its tags, and its code as it is", () => {
  expect(setSymbols('<p title="R_A">R_A, <code>R_A</code></p>')).toBe(
    '<p title="R_A"><span class="symbol">R<sub>A</sub></span>, <code>R_A</code></p>',
  );
});
