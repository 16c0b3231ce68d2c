import type { Formula } from "../../stage/citation.ts";

/** Formulas that every band-pass shares. */
export const noiseBandwidthFormula: Formula = {
  id: "noise-bandwidth",
  name: "Noise bandwidth",
  tex: String.raw`B_n = \frac{1}{|H_0|^2}\int_0^\infty |H(j2\pi f)|^2\,df = \frac{\pi}{2}\,\frac{f_0}{Q}\ \text{(second order)}`,
  holds: "Exact for any order by the recursion named.",
  sources: ["noise-bandwidth"],
};

export const outputNoiseFormula = (source: string): Formula => ({
  id: "noise",
  name: "Noise at the output",
  tex: String.raw`V_o = \frac{V_n}{\sqrt{\tfrac{\pi}{2} f_c}}\,|H_0|\,\sqrt{B_n}`,
  holds: "Noise that is white across the band-pass: f_c well above f_0.",
  sources: [source],
});
