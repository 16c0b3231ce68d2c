import type { Formula } from "../../../../stage/citation.ts";
import { noiseBandwidthFormula, outputNoiseFormula } from "../../formulas.ts";

const source = "passive-derivation";
const sum = String.raw`S = R_1C_1 + R_2C_2 + R_1C_2`;
const holds = "Without source resistance and load; the figures include both exactly.";

export const formulas: readonly Formula[] = [
  {
    id: "centre",
    name: "Centre frequency",
    tex: String.raw`f_0 = \frac{1}{2\pi\sqrt{R_1R_2C_1C_2}}`,
    holds,
    sources: [source],
  },
  {
    id: "quality",
    name: "Quality factor",
    tex: String.raw`Q = \frac{\sqrt{R_1R_2C_1C_2}}{S},\quad ${sum}`,
    holds: `${holds} Never ½ or more; ⅓ for equal parts.`,
    sources: [source],
  },
  { id: "gain", name: "Peak gain", tex: String.raw`H_0 = \frac{R_1C_1}{S}`, holds, sources: [source] },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`B = f_0/Q,\quad f_{1,2} = \sqrt{f_0^2 + B^2/4} \mp B/2`,
    holds: "Always: second order.",
    sources: [source],
  },
  {
    id: "response",
    name: "Response",
    tex: String.raw`H(s) = \frac{sC_1/R_2}{\left(\frac1{R_1}+sC_1\left(1+\frac{R_s}{R_1}\right)\right)P + (1+sC_1R_s)\frac{1}{R_2}\left(\frac1{R_L}+sC_2\right)},\quad P = \frac1{R_2}+\frac1{R_L}+sC_2`,
    holds: "Exact.",
    sources: [source],
  },
  {
    id: "design",
    name: "Sizing",
    tex: String.raw`R_1 = \frac{1}{2\pi f_0C_1},\quad R_2 = \frac{1}{2\pi f_0C_2},\quad C_2 = C_1/10`,
    holds: "The smaller C_2 against C_1, the nearer Q is to ½. Source and load are corrected for.",
    sources: [source],
  },
  noiseBandwidthFormula,
  outputNoiseFormula(source),
];
