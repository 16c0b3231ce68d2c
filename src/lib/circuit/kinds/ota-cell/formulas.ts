import type { Formula } from "../../stage/citation.ts";

const shared: readonly Formula[] = [
  {
    id: "transconductance",
    name: "Transconductance",
    tex: String.raw`I_{out} = I_{abc}\tanh\frac{V_d}{2V_T},\quad g_m = \frac{I_{abc}}{2V_T}`,
    holds: "Ideal pair; parts of the class stray by 30 % either way, halves of one package match closely.",
    sources: ["dual-ota", "pair-derivation"],
  },
  {
    id: "attenuation",
    name: "Divider",
    tex: String.raw`k = \frac{R_{sh}}{R_{sh} + R_{in} + R_s},\quad R' = R_{sh}\parallel(R_{in} + R_s)`,
    holds: "Input current of the pair left out.",
    sources: ["pair-derivation"],
  },
  {
    id: "diodes",
    name: "Linearising diodes",
    tex: String.raw`k V_s = 2V_T\operatorname{artanh} t + R' I_D\,t,\quad I_{out} = I_{abc}\,t,\quad g_m' = \frac{I_{abc}}{2V_T + R' I_D},\quad D = \frac{R' I_D}{2V_T}`,
    holds: "Exact for R' at both inputs; t is found by Newton's method inside a bracket.",
    sources: ["dual-ota", "pair-derivation"],
  },
  {
    id: "distortion",
    name: "Distortion and compression",
    tex: String.raw`d_{sine} = \frac{\sqrt{b_3^2 + b_5^2 + \dots}}{b_1},\qquad g = \frac{E[x f(x)]}{E[x^2]},\quad d_{noise} = \frac{\sqrt{E[(f - g x)^2]}}{g\,\sigma}`,
    holds:
      "Numeric Fourier coefficients and Gaussian means of the exact law. The rule of thumb (1/12)(V_pk/2V_T)² is 4 % high at 20 mV and 23 % at 50 mV, and is not used.",
    sources: ["pair-derivation"],
  },
  {
    id: "drift",
    name: "Drift",
    tex: String.raw`\alpha = -\frac{1}{T}\,\frac{2V_T}{2V_T + R' I_D}`,
    holds: "At a steady bias current.",
    sources: ["pair-derivation"],
  },
  {
    id: "thump",
    name: "Thump",
    tex: String.raw`V_\Sigma = |V_{os}| + \left(\frac{I_{abc}}{2\beta} + \frac{I_D}{2}\right)\left(|R' - R_n| + m R'\right),\quad V_{th} = V_c\,t(V_\Sigma)`,
    holds: "All offsets of one sign: the worst sum. A trim takes it out at one temperature.",
    sources: ["pair-derivation", "dual-ota"],
  },
  {
    id: "trim",
    name: "Trim",
    tex: String.raw`V_t = \pm V_{rail}\,\frac{R_n}{R_t + R_n}`,
    holds: "Pot between the rails, its own resistance far below R_t; 270° of travel.",
    sources: ["pair-derivation"],
  },
  {
    id: "noise",
    name: "Noise floor",
    tex: String.raw`e_o = \sqrt{2 q I_{abc} F}\,R,\quad E_o = e_o\sqrt{\tfrac{\pi}{2}\,20\,\mathrm{kHz}}`,
    holds: "An order of magnitude: F is taken as 2.",
    sources: ["memory"],
  },
];

export const transimpedanceFormulas: readonly Formula[] = [
  ...shared,
  {
    id: "gain",
    name: "Gain",
    tex: String.raw`A = -k\,g_m' R_f`,
    holds: "Small signals, well below the bandwidth.",
    sources: ["pair-derivation"],
  },
  {
    id: "ceiling",
    name: "Ceiling",
    tex: String.raw`V_c = I_{abc} R_f,\quad V_o = V_c\,t`,
    holds: "Where the op amp can swing as far.",
    sources: ["dual-ota", "pair-derivation"],
  },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`\left(1 + \left(2\pi f_3 R_f C_f\right)^2\right)\left(1 + (f_3/f_t)^2\right) = 2`,
    holds: "Single-pole op amp driven by a current source: it adds a pole at its gain-bandwidth.",
    sources: ["pair-derivation"],
  },
];

export const resistorLoadFormulas: readonly Formula[] = [
  ...shared,
  {
    id: "gain",
    name: "Gain",
    tex: String.raw`A = k\,g_m' R_L`,
    holds: "Small signals, well below the bandwidth; an ideal buffer follows.",
    sources: ["pair-derivation"],
  },
  {
    id: "ceiling",
    name: "Ceiling",
    tex: String.raw`V_c = I_{abc} R_L,\quad V_o = V_c\,t`,
    holds: "Where the output can swing as far.",
    sources: ["dual-ota", "pair-derivation"],
  },
  {
    id: "bandwidth",
    name: "Bandwidth",
    tex: String.raw`f_3 = \frac{1}{2\pi R_L C_L}`,
    holds: "The amplifier's own output capacitance belongs to C_L.",
    sources: ["pair-derivation"],
  },
  {
    id: "slew",
    name: "Slew rate",
    tex: String.raw`SR = \frac{I_{abc}}{C_L}`,
    holds: "It falls with the envelope.",
    sources: ["pair-derivation"],
  },
  {
    id: "largest-load",
    name: "Largest load",
    tex: String.raw`R_{L,max} = \frac{V_{swing}}{I_{abc}}`,
    holds: "Swing taken as 1.5 V short of the nearer rail.",
    sources: ["memory"],
  },
];
