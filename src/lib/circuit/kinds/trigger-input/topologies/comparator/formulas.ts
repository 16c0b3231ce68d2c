import type { Formula } from "../../../../stage/citation.ts";
import { sharedFormulas } from "../../formulas.ts";

export const formulas: readonly Formula[] = [
  {
    id: "threshold",
    name: "Thresholds",
    tex: String.raw`V_{T\pm} = V_{ref}\Bigl(1 + \frac{R_{in}}{R_h}\Bigr) - V_{ol,oh}\frac{R_{in}}{R_h},\quad V_h = (V_{oh} - V_{ol})\frac{R_{in}}{R_h},\quad V_{ref} = V_+\frac{R_{r2}}{R_{r1} + R_{r2}}`,
    holds: "Ideal comparator: no offset, no bias current, output levels as given.",
    sources: ["derivation"],
  },
  {
    id: "input-resistance",
    name: "Input resistance and lowest input",
    tex: String.raw`R_{in,total} = R_{in} + R_h,\quad V_{p,low} = \frac{V_{low} R_h + V_{ol} R_{in}}{R_{in} + R_h}`,
    holds: "The output is stiff.",
    sources: ["derivation"],
  },
  {
    id: "pulse-width",
    name: "Pulse width",
    tex: String.raw`t_w = t_g + t_r\Bigl(2 - \frac{V_{T+} + V_{T-}}{V_s}\Bigr)\quad\text{or, behind a differentiator,}\quad t_w = \tau_d \ln\frac{V_{peak}}{V_{T-}}`,
    holds: "Straight edges of equal time; the differentiator is not loaded by R_in.",
    sources: ["derivation"],
  },
  ...sharedFormulas,
];
