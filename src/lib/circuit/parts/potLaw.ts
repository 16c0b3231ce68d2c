/**
 * How the resistance of a pot follows its rotation. Laws are stored in words, since the letters that makers print
 * contradict each other (IEC 60393-1 specifies the tests; no letter is relied on here).
 */
export type PotLaw = "linear" | "logarithmic" | "reverse-logarithmic";

/** Share of the track at mid-travel for the logarithmic laws: 10, 15 and 20 % occur. From memory. */
const defaultMidFraction = 0.15;

/**
 * The share a of the track that is passed at rotation x of the electrical travel.
 *
 * Logarithmic: a = (b^x − 1)/(b − 1) with b = (1/m − 1)², so that a(0) = 0, a(1/2) = m, a(1) = 1. Reverse: 1 − a(1 − x).
 *
 * @param x 0 to 1
 * @param midFraction m, between 0 and 1 but not 1/2
 */
export function potFraction(law: PotLaw, x: number, midFraction = defaultMidFraction): number {
  if (!(x >= 0 && x <= 1)) throw new RangeError(`potFraction: rotation must lie in 0 to 1, got ${x}`);
  if (law === "linear") return x;
  if (law === "reverse-logarithmic") return 1 - potFraction("logarithmic", 1 - x, midFraction);
  const base = (1 / midFraction - 1) ** 2;
  return (base ** x - 1) / (base - 1);
}
