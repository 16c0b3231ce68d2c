/** SI prefixes from femto to giga (SI Brochure, 9th edition, table 7), with the letters people type for them. */
export const prefixes = [
  { symbol: "f", exponent: -15, typed: ["f"] },
  { symbol: "p", exponent: -12, typed: ["p"] },
  { symbol: "n", exponent: -9, typed: ["n"] },
  // U+00B5 and U+03BC look alike and both occur on keyboards; "u" stands in for them where neither can be typed.
  { symbol: "µ", exponent: -6, typed: ["u", "\u00b5", "\u03bc"] },
  { symbol: "m", exponent: -3, typed: ["m"] },
  { symbol: "", exponent: 0, typed: [] },
  // IEC 60062 marks kilo with a capital K; SI with a small one.
  { symbol: "k", exponent: 3, typed: ["k", "K"] },
  { symbol: "M", exponent: 6, typed: ["M"] },
  { symbol: "G", exponent: 9, typed: ["G"] },
] as const;

const exponents = new Map<string, number>(
  prefixes.flatMap((p) => p.typed.map((letter) => [letter, p.exponent] as const)),
);

/** The power of ten that a typed prefix letter stands for, or undefined where the letter is no prefix. */
export function prefixExponent(letter: string): number | undefined {
  return exponents.get(letter);
}
