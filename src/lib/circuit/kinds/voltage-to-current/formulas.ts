import type { Formula } from "../../stage/citation.ts";

export const driverFormulas: readonly Formula[] = [
  {
    id: "current",
    name: "Current",
    tex: String.raw`I = \frac{V_{env} + V_{os}}{R_E}\,\frac{\beta}{\beta + 1}`,
    holds: "Exact while the loop holds; zero below ground, and constant beyond what can be followed.",
    sources: ["converter-derivation", "art-of-electronics"],
  },
  {
    id: "floor",
    name: "Current at rest",
    tex: String.raw`I_{floor} = \frac{V_{rest} + |V_{os}|}{R_E},\quad D = 20\log_{10}\frac{V_{rest} + |V_{os}|}{V_{env}}`,
    holds: "A bound: an offset of the other sign leaves no current, and the base takes its share.",
    sources: ["converter-derivation"],
  },
  {
    id: "fault",
    name: "Current with the op amp stuck high",
    tex: String.raw`I_{fault} = \frac{V_+ - V_{loss}}{R_E}`,
    holds: "A bound on the safe side: the base-emitter voltage, some 0.65 V, is left out.",
    sources: ["converter-derivation"],
  },
  {
    id: "headroom",
    name: "Voltage to spare",
    tex: String.raw`V_{CE} = V_+ - V_{BE} - I R_{deg} - V_{env},\quad V_{reach} = \min\!\left(\frac{V_{swing} - V_{BE}}{1 + R_b/(R_E(\beta + 1))},\ \frac{V_+ - V_{BE} - V_{CEsat}}{1 + \frac{\beta}{\beta+1}\,R_{deg}/R_E}\right)`,
    holds: "V_BE of the mirror and of the transistor taken as 0.65 V, saturation as 0.2 V.",
    sources: ["converter-derivation", "memory"],
  },
  {
    id: "limit-resistor",
    name: "Limiting resistor",
    tex: String.raw`R_{lim} = \frac{V_+ - V_{BE} - V_{CEsat} - V_{pin}}{1\,\mathrm{mA}}`,
    holds: "Between the mirror and the bias pin, with the mirror saturated.",
    sources: ["converter-derivation", "dual-ota"],
  },
  {
    id: "recovery",
    name: "Recovery",
    tex: String.raw`t_{rec} = \frac{|V_-| - V_{loss} + 0.6\,\mathrm{V}}{SR},\quad V_{EB} = |V_-| - V_{loss}`,
    holds: "At the slew rate alone; an op amp's own recovery from saturation comes on top.",
    sources: ["converter-derivation", "memory"],
  },
];

export const resistorFormulas: readonly Formula[] = [
  {
    id: "current",
    name: "Current",
    tex: String.raw`I = \frac{V_{env} - V_p}{R},\quad V_p = V_- + V_{pin}`,
    holds: "The bias pin is taken as a steady voltage, 1.2 to 1.4 V above the negative rail.",
    sources: ["converter-derivation", "memory"],
  },
  {
    id: "floor",
    name: "Current at rest",
    tex: String.raw`I_{floor} = \frac{V_{rest} - V_p}{R}`,
    holds: "Zero where the envelope rests below the pin.",
    sources: ["converter-derivation"],
  },
  {
    id: "fault",
    name: "Current with the op amp stuck high",
    tex: String.raw`I_{fault} = \frac{V_+ - V_{loss} - V_p}{R}`,
    holds: "With an op amp as the envelope's buffer.",
    sources: ["converter-derivation"],
  },
  {
    id: "headroom",
    name: "Across the resistor",
    tex: String.raw`V_{env} - V_p`,
    holds: "At the peak.",
    sources: ["converter-derivation"],
  },
  {
    id: "drift",
    name: "Drift and spread",
    tex: String.raw`\alpha = \frac{4\,\mathrm{mV/K}}{V_{env} - V_p},\quad \varepsilon_p = \frac{\pm 0.1\,\mathrm{V}}{V_{env} - V_p}`,
    holds: "Two junctions in the pin, at the peak.",
    sources: ["converter-derivation", "memory"],
  },
];
