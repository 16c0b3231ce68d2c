import type { Formula } from "../../../../stage/citation.ts";
import { sharedFormulas } from "../../formulas.ts";

export const formulas: readonly Formula[] = [
  {
    id: "threshold",
    name: "Threshold",
    tex: String.raw`V_{th} = V_{BE}\Bigl(1 + \frac{R_A}{R_B}\Bigr) + \frac{I_C}{\beta} R_A,\quad \frac{dV_{th}}{dT} = -2\,\mathrm{mV/K}\,\Bigl(1 + \frac{R_A}{R_B}\Bigr)`,
    holds:
      "At the edge of conduction I_C is zero; at half the saturated collector current V_BE is V_T ln(I_C/I_S). The drift is a class figure from memory.",
    sources: ["derivation", "memory"],
  },
  {
    id: "input-resistance",
    name: "Input resistance",
    tex: String.raw`R_{in} = R_A + R_B,\quad R_{edge} = R_S + R_D \parallel (R_A + R_B)`,
    holds: "Before the transistor conducts. At rest the capacitor blocks.",
    sources: ["derivation"],
  },
  {
    id: "pulse-width",
    name: "Pulse width",
    tex: String.raw`t_w = (R_e + R_S) C_D \ln\frac{V_{pk} - V_\infty}{V_{th} - V_\infty},\quad R_e = R_D \parallel R_A,\ V_\infty = V_{BE}\frac{R_e}{R_A},\ V_{pk} = \Bigl(\frac{V_s}{R_S} + \frac{V_{BE}}{R_A}\Bigr)(R_S \parallel R_e)`,
    holds:
      "To the edge of conduction, the base held at V_BE until then; a gate longer than the pulse. The textbook width (R_D + R_S) C_D ln(V_s R_D/((R_D + R_S) V_th)) leaves the base out.",
    sources: ["derivation"],
  },
  {
    id: "pulse-through-junction",
    name: "Pulse width through the junction",
    tex: String.raw`t_{w,1/2} = \int_{v_{1/2}}^{v_0} \frac{C_D}{i}\,\frac{d(v_a + R_S i)}{dv_b}\,dv_b,\quad v_a = v_b + R_A\Bigl(\frac{v_b}{R_B} + i_b(v_b)\Bigr),\ i = \frac{v_a}{R_D} + \frac{v_b}{R_B} + i_b`,
    holds: "Exact for an exponential base current I_S/β (e^(v_b/V_T) − 1); stored charge is left out.",
    sources: ["derivation"],
  },
  ...sharedFormulas,
];
