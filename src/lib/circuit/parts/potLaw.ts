/**
 * How the resistance of a pot follows its rotation. Laws are stored in words, since the letters that makers print
 * contradict each other (IEC 60393-1 specifies the tests; no letter is relied on here).
 */
export type PotLaw = "linear" | "logarithmic" | "reverse-logarithmic";

/** The smooth curve of the formula, or the two straight segments that real carbon tracks are printed in. */
export type PotLawShape = "curve" | "two-segment";

/** Share of the track at mid-travel for the logarithmic laws: 10, 15 and 20 % occur. From memory. */
const defaultMidFraction = 0.15;

/**
 * The share a of the track that is passed at rotation x of the electrical travel.
 *
 * Logarithmic: a = (b^x − 1)/(b − 1) with b = (1/m − 1)², so that a(0) = 0, a(1/2) = m, a(1) = 1; or two straight
 * segments through (1/2, m). Reverse: 1 − a(1 − x).
 *
 * @param x 0 to 1
 * @param midFraction m, between 0 and 1 but not 1/2 for the curve
 */
export function potFraction(
  law: PotLaw,
  x: number,
  midFraction = defaultMidFraction,
  shape: PotLawShape = "curve",
): number {
  if (!(x >= 0 && x <= 1)) throw new RangeError(`potFraction: rotation must lie in 0 to 1, got ${x}`);
  if (law === "linear") return x;
  if (law === "reverse-logarithmic") return 1 - potFraction("logarithmic", 1 - x, midFraction, shape);
  if (shape === "two-segment") return x < 0.5 ? 2 * midFraction * x : midFraction + (1 - midFraction) * (2 * x - 1);
  const base = logarithmicBase(midFraction);
  return (base ** x - 1) / (base - 1);
}

/** Slope da/dx of the law; at the knee of two segments, that of the upper one. */
export function potSlope(
  law: PotLaw,
  x: number,
  midFraction = defaultMidFraction,
  shape: PotLawShape = "curve",
): number {
  if (law === "linear") return 1;
  if (law === "reverse-logarithmic") return potSlope("logarithmic", 1 - x, midFraction, shape);
  if (shape === "two-segment") return 2 * (x < 0.5 ? midFraction : 1 - midFraction);
  const base = logarithmicBase(midFraction);
  return (base ** x * Math.log(base)) / (base - 1);
}

/** b of the logarithmic law from the share at mid-travel. */
export const logarithmicBase = (midFraction: number): number => (1 / midFraction - 1) ** 2;
