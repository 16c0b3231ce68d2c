import type { Formula } from "../../../../stage/citation.ts";
import { noiseBandwidthFormula, outputNoiseFormula } from "../../formulas.ts";

const source = "bridged-t-derivation";

export const formulas: readonly Formula[] = [
  {
    id: "centre",
    name: "Centre frequency",
    tex: String.raw`f_0 = \frac{1}{2\pi\sqrt{C_1 C_2 R_1 R_2}}`,
    holds:
      "Ideal op amp; R_1 includes the pot, R_2 the leakage beside it. With a finite gain-bandwidth the exact poles are used instead.",
    sources: [source],
  },
  {
    id: "quality",
    name: "Quality factor",
    tex: String.raw`Q = \sqrt{\frac{R_2}{R_1}}\,\frac{\sqrt{C_1C_2}}{C_1+C_2} = \tfrac12\sqrt{R_2/R_1}\ (C_1 = C_2)`,
    holds: "Ideal op amp.",
    sources: [source],
  },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`B = f_0/Q`,
    holds: "Of the pair of poles. The response itself is a low-pass with a peak.",
    sources: [source],
  },
  {
    id: "ring-time",
    name: "Ring time",
    tex: String.raw`\tau = \frac{Q}{\pi f_0} = \frac{2R_2C_1C_2}{C_1+C_2},\quad t_{60} = \ln 1000\;\tau`,
    holds:
      "R_1 is not in it: pitch moves at constant ring time. With a real op amp τ is that of the exact pair of poles.",
    sources: [source],
  },
  {
    id: "gain",
    name: "Gain at the centre",
    tex: String.raw`|H(f_0)| = \frac{R_2}{R_\mathrm{in}}\sqrt{1+Q^2}`,
    holds: "Ideal op amp; read off the exact response. Inverts at DC.",
    sources: [source],
  },
  {
    id: "dc-gain",
    name: "Gain at DC",
    tex: String.raw`|H(0)| = R_2/R_\mathrm{in}`,
    holds: "Ideal op amp: the pulse passes by this.",
    sources: [source],
  },
  {
    id: "response",
    name: "Response",
    tex: String.raw`H(s) = -\frac{D/R_\mathrm{in}}{E + \sigma F},\quad D = \tfrac1{R_1}+s(C_1+C_2),\ E = \tfrac{D}{R_2}+s^2C_1C_2,\ F = \left(\tfrac1{R_\mathrm{in}}+\tfrac1{R_2}\right)D+\tfrac{sC_1}{R_1}+s^2C_1C_2,\ \sigma = \tfrac1{A_0}+\tfrac{s}{2\pi f_t}`,
    holds: "Single-pole op amp without output resistance; σ = 0 for an ideal one.",
    sources: [source],
  },
  {
    id: "ring-peak",
    name: "Peak of the struck ring",
    tex: String.raw`v(t) = V_p\sum_k \frac{r_k}{p_k}\left(e^{p_kt} - e^{p_k(t-t_p)}\right)`,
    holds:
      "Exact for a rectangular pulse, over all poles p_k with residues r_k; the peak is where its slope vanishes. Clipping is left out.",
    sources: [source],
  },
  {
    id: "ring-estimate",
    name: "Ring amplitude, short pulse",
    tex: String.raw`\hat v \approx 2|r|\,V_p t_p\,\frac{\sin\pi f_0t_p}{\pi f_0t_p}`,
    holds:
      "An estimate for pulses below a quarter of a period, without the ring's decay: high by some per cent. The peak above is exact.",
    sources: [source],
  },
  {
    id: "noise-gain",
    name: "Noise gain at the centre",
    tex: String.raw`N = 1 + \frac{R_2}{R_1}\,\frac{C_1}{C_1+C_2} = 1 + 2Q^2\ (C_1=C_2)`,
    holds: "Without R_in, which adds about R_2/R_in.",
    sources: [source],
  },
  {
    id: "offset",
    name: "Offset at the output",
    tex: String.raw`V_o = V_{os}\left(1 + \frac{R_2}{R_\mathrm{in}}\right) + I_b R_2`,
    holds: "Worst sign of both. A strike through a capacitor takes R_in out of it.",
    sources: [source],
  },
  {
    id: "design",
    name: "Sizing",
    tex: String.raw`R_2 = \frac{t_{60}}{\ln 1000}\,\frac{C_1+C_2}{2C_1C_2},\quad R_1 = \frac{1}{(2\pi f_0)^2C_1C_2R_2}`,
    holds: "For a real op amp the targets are corrected until the exact poles meet them.",
    sources: [source],
  },
  noiseBandwidthFormula,
  outputNoiseFormula(source),
];
