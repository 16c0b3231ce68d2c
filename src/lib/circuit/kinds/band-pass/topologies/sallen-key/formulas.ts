import type { Formula } from "../../../../stage/citation.ts";
import { noiseBandwidthFormula, outputNoiseFormula } from "../../formulas.ts";

const source = "sallen-key-derivation";

export const formulas: readonly Formula[] = [
  {
    id: "centre",
    name: "Centre frequency",
    tex: String.raw`f_0 = \frac{1}{2\pi}\sqrt{\frac{1/R_1 + 1/R_3}{C_1 C_2 R_2}} = \frac{\sqrt 2}{2\pi R C}\ \text{(equal parts)}`,
    holds:
      "Ideal op amp; R_1 includes the source resistance and R_2 the pot. With a finite gain-bandwidth the exact third-order response is used instead.",
    sources: [source, "franco"],
  },
  {
    id: "amplifier",
    name: "Amplifier gain",
    tex: String.raw`K = 1 + R_F/R_G`,
    holds: "At low frequency.",
    sources: [source],
  },
  {
    id: "quality",
    name: "Quality factor",
    tex: String.raw`Q = \frac{\sqrt{(1/R_1 + 1/R_3)\,C_1 C_2 R_2}}{C_1 + C_2 + C_2 R_2\left(\frac{1}{R_1} + \frac{1-K}{R_3}\right)} = \frac{\sqrt 2}{4-K}\ \text{(equal parts)}`,
    holds: "Ideal op amp. The network oscillates where the denominator vanishes, at K = 4 for equal parts.",
    sources: [source, "franco"],
  },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`B = f_0/Q`,
    holds: "Always: all three are read off the exact response.",
    sources: [source],
  },
  {
    id: "gain",
    name: "Peak gain",
    tex: String.raw`H_0 = \frac{K C_2 R_2/R_1}{C_1 + C_2 + C_2 R_2\left(\frac{1}{R_1} + \frac{1-K}{R_3}\right)} = \frac{K}{4-K}\ \text{(equal parts)}`,
    holds: "Ideal op amp. It follows from Q and cannot be chosen: to lower it, make a divider of R_1.",
    sources: [source, "franco"],
  },
  {
    id: "sensitivity",
    name: "How far Q strays",
    tex: String.raw`\frac{\mathrm dQ/Q}{\mathrm dK/K} = \frac{K}{K_\mathrm{osc} - K}`,
    holds:
      "Ideal op amp. Least and most Q are those of the exact response with R_F and R_G at opposite ends of their tolerance.",
    sources: [source],
  },
  {
    id: "response",
    name: "Response with a real op amp",
    tex: String.raw`H(s) = \frac{K\,sC_2/R_1}{(1+K\sigma)E - K\,sC_2/R_3},\quad E = \frac{G}{R_2} + s\left(C_2 G + \frac{C_1+C_2}{R_2}\right) + s^2 C_1 C_2,\quad \sigma = \frac{1}{A_0} + \frac{s}{2\pi f_t},\ G = \frac1{R_1}+\frac1{R_3}`,
    holds: "Single-pole op amp without output resistance.",
    sources: [source],
  },
  {
    id: "design",
    name: "Sizing, equal resistors and capacitors",
    tex: String.raw`R = \frac{\sqrt 2}{2\pi f_0 C},\quad K = 4 - \frac{\sqrt 2}{Q}`,
    holds: "For a real op amp and source the targets are corrected until the exact response meets them.",
    sources: [source, "franco"],
  },
  noiseBandwidthFormula,
  outputNoiseFormula(source),
];
