import type { Formula } from "../../stage/citation.ts";

/** Said alike for every mirror. */
const shared: readonly Formula[] = [
  {
    id: "split",
    name: "Errors",
    tex: String.raw`\varepsilon = \frac{m}{m_0} - 1,\quad 1 + \varepsilon \approx (1 + \varepsilon_\beta)(1 + \varepsilon_A)(1 + \varepsilon_V)(1 + \varepsilon_j)`,
    holds:
      "Each share comes from the exact solution with only its cause at work (the mismatch: with and without it); their product misses the whole by the products of their causes.",
    sources: ["mirror-derivation"],
  },
  {
    id: "mismatch",
    name: "Mismatch",
    tex: String.raw`\varepsilon_V = e^{\Delta V_{BE}/V_T} - 1 \quad\text{or, degenerated,}\quad \approx \frac{\Delta V_{BE}}{V_T + I R},\quad \Delta V_{BE} \mathrel{+}= 2\,\mathrm{mV/K}\cdot\Delta T`,
    holds: "The exponential is exact without degeneration and Early effect; the figures are solved exactly.",
    sources: ["mirror-derivation", "memory"],
  },
  {
    id: "output-resistance",
    name: "Output resistance",
    tex: String.raw`R_{out} = \left(\frac{d I_{out}}{d V_{CE2}}\right)^{-1}`,
    holds:
      "Slope of the exact solution, with the base line free to move; a resistor in the output adds to it. Ideal transistors have none to state.",
    sources: ["mirror-derivation"],
  },
  {
    id: "dissipation",
    name: "Dissipation",
    tex: String.raw`P = V_{CE2}\,I_{out}`,
    holds: "Base current left out.",
    sources: ["mirror-derivation"],
  },
  {
    id: "tail",
    name: "Bend of a decay",
    tex: String.raw`b = 20\left|\log_{10}\frac{m(I_{ref}/100)}{m(I_{ref})}\right|`,
    holds: "A ratio that moves with the current bends a decay that is straight in dB.",
    sources: ["mirror-derivation"],
  },
];

const pairBase: Formula = {
  id: "base-current",
  name: "Base currents",
  tex: String.raw`\frac{I_{out}}{I_{ref}} = \frac{m}{1 + (1 + \textstyle\sum m)/\beta},\quad \text{with a follower: divided again by } \beta + 1`,
  holds: "Exact without Early effect; m from the resistors or 1.",
  sources: ["mirror-derivation", "sedra-smith"],
};

const pairEarly: Formula = {
  id: "early",
  name: "Early effect",
  tex: String.raw`1 + \varepsilon_A = \frac{1 + V_{CE2}/V_A}{1 + V_{CE1}/V_A}`,
  holds: "Exact without degeneration; the follower's V_BE is taken as 0.6 V in V_CE1.",
  sources: ["mirror-derivation", "early-note"],
};

export const simpleFormulas: readonly Formula[] = [
  {
    id: "balance",
    name: "Currents at the reference node",
    tex: String.raw`I_{ref} = I_{C1} + \frac{I_{C1} + n\,I_{out}}{\beta},\quad I_C = I_S\,e^{V_{BE}/V_T}\left(1 + \frac{V_{CE}}{V_A}\right)`,
    holds: "Solved exactly; β is the ratio of collector to base current where each transistor works.",
    sources: ["mirror-derivation"],
  },
  pairBase,
  pairEarly,
  {
    id: "textbook-output-resistance",
    name: "Output resistance, textbook",
    tex: String.raw`r_o = \frac{V_A + V_{CE2}}{I_{ref}}`,
    holds: "Takes the reference current for the output current: high by the ratio of the two.",
    sources: ["sedra-smith"],
  },
  {
    id: "compliance",
    name: "Voltage needed",
    tex: String.raw`V_{min} = V_{CEsat},\quad V_{spare} = V_+ - V_{out} - I_{out}R_{lim} - V_{min}`,
    holds: "Saturation taken as 0.2 V.",
    sources: ["memory"],
  },
  ...shared,
];

export const degeneratedFormulas: readonly Formula[] = [
  {
    id: "balance",
    name: "Loop of the emitters",
    tex: String.raw`I_{E2}R_2 + V_T\ln\frac{I_{C2}}{I_S(1 + V_{CE2}/V_A)} = I_{E1}R_1 + V_T\ln\frac{I_{C1}}{I_S(1 + V_{CE1}/V_A)} + \Delta V_{BE}`,
    holds:
      "Solved exactly together with the currents at the reference node, I_E = I_C(1 + 1/β). The ratio tends to R1/R2 only when I·R is far above V_T.",
    sources: ["mirror-derivation"],
  },
  pairBase,
  pairEarly,
  {
    id: "textbook-output-resistance",
    name: "Output resistance, textbook",
    tex: String.raw`r_o\left(1 + g_m(R_2\parallel r_\pi)\right) + R_2\parallel r_\pi`,
    holds:
      "Takes the base line as fixed and the reference current for the output current; the exact slope is lower by what the reference's side adds at the base, 10 % in the worked example.",
    sources: ["sedra-smith"],
  },
  {
    id: "compliance",
    name: "Voltage needed",
    tex: String.raw`V_{min} = V_{CEsat} + I_{E2}R_2,\quad V_{spare} = V_+ - V_{out} - I_{out}R_{lim} - V_{min}`,
    holds: "Saturation taken as 0.2 V.",
    sources: ["memory"],
  },
  ...shared,
];

export const wilsonFormulas: readonly Formula[] = [
  {
    id: "balance",
    name: "Currents at the two inner nodes",
    tex: String.raw`I_{ref} = I_{C1} + \frac{I_{out}}{\beta},\quad I_{out}\left(1 + \frac{1}{\beta}\right) = I_{C2} + \frac{I_{C1} + I_{C2}}{\beta}`,
    holds: "Solved exactly with the device law of the simple mirror.",
    sources: ["mirror-derivation"],
  },
  {
    id: "base-current",
    name: "Base currents",
    tex: String.raw`\varepsilon_\beta = \frac{-2}{\beta^2 + 2\beta + 2}`,
    holds: "Exact without Early effect.",
    sources: ["mirror-derivation", "sedra-smith"],
  },
  {
    id: "early",
    name: "Early effect",
    tex: String.raw`1 + \varepsilon_A = \frac{1 + V_{BE}/V_A}{1 + (V_{BE} + V_{BE3})/V_A} \approx 1 - \frac{V_{BE}}{V_A}`,
    holds: "The inner pair differ by one V_BE; the output's own voltage hardly matters.",
    sources: ["mirror-derivation"],
  },
  {
    id: "textbook-output-resistance",
    name: "Output resistance, textbook",
    tex: String.raw`\frac{\beta\,r_o}{2},\quad r_o = \frac{V_A}{I_{ref}}`,
    holds:
      "Leaves out V_CE, which raises it by V_CE/V_A, and a share near β·V_T/(2·V_A), which lowers it. Not stated without base currents.",
    sources: ["sedra-smith"],
  },
  {
    id: "compliance",
    name: "Voltage needed",
    tex: String.raw`V_{min} = V_{BE} + V_{CEsat},\quad V_{spare} = V_+ - V_{out} - I_{out}R_{lim} - V_{min}`,
    holds: "Saturation taken as 0.2 V.",
    sources: ["memory"],
  },
  ...shared,
];
