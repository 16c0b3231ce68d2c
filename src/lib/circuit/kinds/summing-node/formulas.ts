import type { Formula } from "../../stage/citation.ts";

export const formulas: readonly Formula[] = [
  {
    id: "gain",
    name: "Gain of each path",
    tex: String.raw`A_k = \frac{R_F}{R_k + R_{s,k}}\,\frac{1}{1 + N/A_0},\quad V_o = -\sum_k A_k V_k`,
    holds: "At low frequency; A_0 counts only with a finite gain-bandwidth.",
    sources: ["sum-derivation", "neets"],
  },
  {
    id: "noise-gain",
    name: "Noise gain",
    tex: String.raw`N = 1 + R_F\sum_k \frac{1}{R_k + R_{s,k}}`,
    holds: "At low frequency. A path at rest counts as one that plays.",
    sources: ["sum-derivation", "noise-gain-note"],
  },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`f_3 = \frac{f_t}{N}\ (C_F = 0),\qquad f_3 = \frac{1}{2\pi R_FC_F}\ (f_t \to \infty)`,
    holds: "With both, the −3 dB point of the exact second-order response.",
    sources: ["sum-derivation", "noise-gain-note"],
  },
  {
    id: "offset",
    name: "Offset",
    tex: String.raw`V_{o} = N\,V_{os}`,
    holds: "Paths coupled at DC; without bias current.",
    sources: ["sum-derivation"],
  },
  {
    id: "level",
    name: "Level of the sum",
    tex: String.raw`V^2 = \sum_k a_k^2 + 2\sum_{j<k} s_js_k\,\rho\,a_ja_k,\quad a_k = A_kV_k`,
    holds:
      "s is +1 for an even, −1 for an odd number of inversions; every two paths share one correlation. A limited path has the correlation that its own page gives.",
    sources: ["sum-derivation"],
  },
  {
    id: "parity-cost",
    name: "What wrong parity costs",
    tex: String.raw`20\log_{10}\frac{V(\text{all alike})}{V(\text{loudest against the rest})}`,
    holds: "At the correlation set.",
    sources: ["sum-derivation"],
  },
  {
    id: "passive",
    name: "Without an op amp",
    tex: String.raw`\frac{1/R_k}{\sum_j 1/R_j + 1/R_L}`,
    holds: "Source resistances counted in; each path then sees the others.",
    sources: ["sum-derivation"],
  },
  {
    id: "design",
    name: "Sizing",
    tex: String.raw`R_k = R_F/A_k - R_{s,k}`,
    holds: "For the first two paths; the others stay as they are.",
    sources: ["sum-derivation", "neets"],
  },
];
