import type { Formula } from "../../stage/citation.ts";

const shared: readonly Formula[] = [
  {
    id: "law",
    name: "Law of the pot",
    tex: String.raw`a = x,\qquad a = \frac{b^x - 1}{b - 1},\ b = \left(\frac{1}{m} - 1\right)^2,\qquad a_{rev}(x) = 1 - a(1 - x)`,
    holds: "A logarithmic law may instead be two straight segments through (1/2, m), as carbon tracks are printed.",
    sources: ["memory", "pot-standard"],
  },
  {
    id: "span",
    name: "Span",
    tex: String.raw`S = 20\log_{10}\frac{y(1)}{y(0)}`,
    holds: "Where the low end is above zero.",
    sources: ["trim-derivation"],
  },
  {
    id: "useful",
    name: "Useful rotation",
    tex: String.raw`\Delta x = \left|y^{-1}(y_{most}) - y^{-1}(y_{least})\right|,\quad \Delta\theta = \theta\,\Delta x`,
    holds: "Exact, inverted numerically; a side of the window beyond the travel counts as the end.",
    sources: ["trim-derivation"],
  },
  {
    id: "sensitivity",
    name: "Sensitivity",
    tex: String.raw`y' = \frac{1}{\theta}\,\frac{dy}{da}\,\frac{da}{dx},\quad s = \frac{y'}{y}`,
    holds: "At the centre of the window; nominal parts.",
    sources: ["trim-derivation"],
  },
  {
    id: "coverage",
    name: "Coverage",
    tex: String.raw`M = \min\left(\frac{y_{1,w}}{y_{most}},\ \frac{y_{least}}{y_{0,w}}\right) - 1`,
    holds: "Worst of all eight corners of pot and resistor tolerance; limits, not spread.",
    sources: ["trim-derivation"],
  },
];

export const rheostatFormulas: readonly Formula[] = [
  {
    id: "value",
    name: "Resistance",
    tex: String.raw`R(x) = R_{fix} + R_{pot}\left(e + (1 - e)\,a(x)\right)`,
    holds: "The far end of the track is tied to the wiper.",
    sources: ["trim-derivation"],
  },
  {
    id: "centre",
    name: "Centre",
    tex: String.raw`x_c = R^{-1}\!\left(\frac{2}{1/R_{least} + 1/R_{most}}\right)\ \text{or}\ R^{-1}\!\left(\frac{R_{least} + R_{most}}{2}\right)`,
    holds: "The first where a voltage across it sets a current: the middle of the currents. Else the second.",
    sources: ["trim-derivation"],
  },
  {
    id: "current",
    name: "Current",
    tex: String.raw`I = V/R`,
    holds: "Only where a voltage across the rheostat is given.",
    sources: ["trim-derivation"],
  },
  ...shared,
];

export const dividerFormulas: readonly Formula[] = [
  {
    id: "value",
    name: "Voltage at the wiper",
    tex: String.raw`V(x) = V_{ref}\,\frac{n}{S + n(S - n)/R_L},\quad n = R_b + R_{pot}\left(e + (1 - 2e)\,a(x)\right),\ S = R_t + R_{pot} + R_b`,
    holds: "Exact with the load; a linear pot and a load of about a ninth of it make 15 % at mid-travel.",
    sources: ["trim-derivation"],
  },
  {
    id: "centre",
    name: "Centre",
    tex: String.raw`x_c = V^{-1}\!\left(\frac{V_{least} + V_{most}}{2}\right)`,
    holds: "Arithmetic middle.",
    sources: ["trim-derivation"],
  },
  {
    id: "wiper",
    name: "Resistance at the wiper",
    tex: String.raw`R_w = \frac{n(S - n)}{S} \le \frac{S}{4}`,
    holds: "Without the load; the reference is stiff.",
    sources: ["trim-derivation"],
  },
  ...shared,
];
