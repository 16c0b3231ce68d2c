import type { Formula } from "../../../../stage/citation.ts";

export const formulas: readonly Formula[] = [
  {
    id: "centre",
    name: "Centre frequency",
    tex: String.raw`f_0 = \frac{1}{2\pi}\sqrt{\frac{1/R_A + 1/R_B}{R_F\,C_1 C_2}}`,
    holds:
      "Ideal op amp; R_A includes the source resistance and R_B the pot. With a finite gain-bandwidth the exact third-order response is used instead.",
    sources: ["mfb-derivation", "op-amps-for-everyone", "franco"],
  },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`B = \frac{C_1 + C_2}{2\pi\,C_1 C_2 R_F}`,
    holds: "Ideal op amp. R_B is not in it: retuning leaves the bandwidth alone.",
    sources: ["mfb-derivation", "franco"],
  },
  {
    id: "quality",
    name: "Quality factor",
    tex: String.raw`Q = f_0 / B`,
    holds: "Always: both are read off the exact response.",
    sources: ["mfb-derivation"],
  },
  {
    id: "gain",
    name: "Peak gain",
    tex: String.raw`H_0 = -\frac{R_F}{R_A}\,\frac{C_2}{C_1 + C_2}`,
    holds: "Ideal op amp. R_B is not in it: retuning leaves the peak gain alone.",
    sources: ["mfb-derivation", "op-amps-for-everyone"],
  },
  {
    id: "response",
    name: "Response with a real op amp",
    tex: String.raw`H(s) = \frac{-s C_2 / R_A}{(1 + \sigma)\left(\frac{G}{R_F} + s\frac{C_1 + C_2}{R_F} + s^2 C_1 C_2\right) + s\sigma\, C_2 G},\quad \sigma = \frac{1}{A_0} + \frac{s}{2\pi f_t},\ G = \frac{1}{R_A} + \frac{1}{R_B}`,
    holds: "Single-pole op amp without output resistance; the figures also include that and the load.",
    sources: ["mfb-derivation"],
  },
  {
    id: "design",
    name: "Sizing, equal capacitors",
    tex: String.raw`R_F = \frac{Q}{\pi f_0 C},\quad R_A = \frac{R_F}{2|H_0|},\quad R_B = \frac{Q}{2\pi f_0 C\,(2Q^2 - |H_0|)}`,
    holds:
      "Needs 2Q² > |H0|. For a real op amp and source the targets are corrected until the exact response meets them.",
    sources: ["mfb-derivation", "op-amps-for-everyone", "franco"],
  },
  {
    id: "noise-bandwidth",
    name: "Noise bandwidth",
    tex: String.raw`B_n = \frac{1}{|H_0|^2}\int_0^\infty |H(j2\pi f)|^2\,df = \frac{\pi}{2}\,\frac{f_0}{Q}\ \text{(ideal op amp)}`,
    holds: "Exact for any order by the recursion named; up to 1 MHz where the op amp has an output resistance.",
    sources: ["noise-bandwidth"],
  },
  {
    id: "noise-gain",
    name: "Noise gain and loop gain at the centre",
    tex: String.raw`N = 1 + \frac{C_2}{C_1 + C_2}\,G R_F = 1 + 2Q^2\ (C_1 = C_2),\quad T = \frac{f_t}{f_0 N}`,
    holds: "At the ideal centre, where the feedback factor is real.",
    sources: ["mfb-derivation"],
  },
  {
    id: "reach",
    name: "Reached by every board",
    tex: String.raw`f_0\big|_{\text{pot in, all parts low}} \;\le\; f \;\le\; f_0\big|_{\text{pot out, all parts high}}`,
    holds: "Worst case over the tolerances given; the source resistance does not stray.",
    sources: ["mfb-derivation"],
  },
  {
    id: "noise",
    name: "Noise at the output",
    tex: String.raw`V_o = \frac{V_n}{\sqrt{\tfrac{\pi}{2} f_c}}\,|H_0|\,\sqrt{B_n}`,
    holds: "Noise that is white across the band-pass: f_c well above f_0.",
    sources: ["mfb-derivation"],
  },
];
