import type { Formula } from "../../../../stage/citation.ts";
import { noiseBandwidthFormula, outputNoiseFormula } from "../../formulas.ts";

const source = "two-integrator-derivation";

export const formulas: readonly Formula[] = [
  {
    id: "centre",
    name: "Centre frequency",
    tex: String.raw`f_0 = \frac{1}{2\pi}\sqrt{\frac{R_b}{R_a\,R_1 R_2\,C_1 C_2}} = \frac{1}{2\pi RC}\ \text{(equal parts)}`,
    holds:
      "Ideal op amps; R_1 and R_2 include the pot. With a finite gain-bandwidth the exact fifth-order response is used instead.",
    sources: [source],
  },
  {
    id: "quality",
    name: "Quality factor",
    tex: String.raw`Q_0 = \frac{1}{\beta N}\sqrt{\frac{R_b R_1 C_1}{R_a R_2 C_2}} = \frac{1}{3\beta}\ \text{(equal parts)},\quad \beta = \frac{R_{Q2}}{R_{Q1}+R_{Q2}}`,
    holds: "Ideal op amps. R_1 and R_2 that move together leave it alone.",
    sources: [source],
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
    tex: String.raw`H_0 = \frac{R_b/R_i}{\beta N} = Q\ \text{(equal resistors)}`,
    holds: "Ideal op amps. It follows from Q; a larger R_i lowers it.",
    sources: [source],
  },
  {
    id: "outputs",
    name: "The other outputs",
    tex: String.raw`H_\mathrm{hp} = -s^2\frac{C_1C_2}{R_i}\Big/D,\quad H_\mathrm{lp} = -\frac{1}{R_iR_1R_2}\Big/D`,
    holds: "Ideal op amps, D as in the response below. Both peak by about Q as well, off the centre.",
    sources: [source],
  },
  {
    id: "enhancement",
    name: "What finite gain-bandwidth does to Q",
    tex: String.raw`\frac1{Q} = \frac1{Q_0} - (2+N)\frac{f_0}{f_t},\quad N = 1 + \frac{R_b}{R_i} + \frac{R_b}{R_a}`,
    holds: "First order in f_0/f_t, for the margin and the limit alone; Q itself is read off the exact response.",
    sources: [source],
  },
  {
    id: "response",
    name: "Response with real op amps",
    tex: String.raw`H_\mathrm{bp} = \frac{I_2}{R_iR_1 D},\quad D = \left(\tfrac{1}{R_b}+\sigma G\right)I_1I_2 + \frac{\beta G}{R_1} I_2 + \frac{1}{R_aR_1R_2},\quad I_k = sC_k + \sigma\left(\tfrac1{R_k}+sC_k\right),\ \sigma = \tfrac{1}{A_0}+\tfrac{s}{2\pi f_t},\ G = \tfrac1{R_i}+\tfrac1{R_a}+\tfrac1{R_b}`,
    holds: "Three alike single-pole op amps without output resistance.",
    sources: [source],
  },
  {
    id: "design",
    name: "Sizing, equal resistors and capacitors",
    tex: String.raw`R = \frac{1}{2\pi f_0 C},\quad \frac{R_{Q1}}{R_{Q2}} = 3Q - 1`,
    holds: "For real op amps and a source the targets are corrected until the exact response meets them.",
    sources: [source],
  },
  noiseBandwidthFormula,
  outputNoiseFormula(source),
  {
    id: "inner-noise",
    name: "Noise at the other outputs",
    tex: String.raw`V^2 = \frac{V_n^2}{\tfrac{\pi}{2} f_c}\int_0^\infty \frac{|H(j2\pi f)|^2}{1+(f/f_c)^2}\,df`,
    holds: "Exact for white noise limited by one pole.",
    sources: [source, "noise-bandwidth"],
  },
];
