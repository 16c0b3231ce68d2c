import type { Formula } from "../../stage/citation.ts";

export const formulas: readonly Formula[] = [
  {
    id: "time-constant",
    name: "Time constant",
    tex: String.raw`\tau = C\,\bigl((R_{min} + a(x) R_V) \parallel R_L \parallel R_{leak}\bigr)`,
    holds: "Once the pulse is over and the diode blocks; its reverse current is left out.",
    sources: ["derivation", "time-constants"],
  },
  {
    id: "decay",
    name: "Decay to −20 and −60 dB",
    tex: String.raw`t_{20} = \tau \ln 10 = 2.303\,\tau,\quad t_{60} = 3\,\tau \ln 10 = 6.908\,\tau`,
    holds: "Of the voltage on the capacitor above its rest; a dead band in the next stage shortens what is heard.",
    sources: ["derivation", "time-constants"],
  },
  {
    id: "dead-band",
    name: "Decay as heard",
    tex: String.raw`t_{-X} = \tau \ln\frac{V_{pk} - V_{ped}}{V_D + 10^{-X/20}(V_{pk} - V_D) - V_{ped}},\quad t_{end} = \tau \ln\frac{V_{pk} - V_{ped}}{V_D - V_{ped}}`,
    holds: "For a next stage that follows v − V_D and does nothing below V_D.",
    sources: ["derivation"],
  },
  {
    id: "spread",
    name: "Longest decay, worst case",
    tex: String.raw`t_{60} = 3 \ln 10 \cdot C(1 \pm t_C)\,\bigl((R_{min}(1 \pm t_R) + R_V(1 \pm t_V)) \parallel R_L \parallel R_{leak}\bigr)`,
    holds: "All parts at the same end of their tolerance; the load does not stray.",
    sources: ["derivation"],
  },
  {
    id: "charge",
    name: "Peak",
    tex: String.raw`C\frac{dv}{dt} = i - \frac{v - V_{ped}}{R},\quad V_p - v = i R_S + n V_T \ln\Bigl(\frac{i}{I_S} + 1\Bigr)`,
    holds:
      "From the rested capacitor, discharge included. Exact for the exponential law (integrated to 10⁻¹³ of the pulse a step) and, in closed form, for a fixed drop V_d in place of the logarithm.",
    sources: ["derivation", "extrapolation"],
  },
  {
    id: "simple-peak",
    name: "Peak, textbook",
    tex: String.raw`V_{pk,0} = (V_p - V_d)\bigl(1 - e^{-t_w/\tau_c}\bigr),\quad \tau_c = R_S C`,
    holds: "Fixed drop, no discharge while charging: a few per cent off where R_min is not far above R_S.",
    sources: ["derivation", "time-constants"],
  },
  {
    id: "charge-current",
    name: "Peak charging current",
    tex: String.raw`I_{pk} = \frac{V_p - V_{ped} - V_d(I_{pk})}{R_S}`,
    holds: "At the front of a pulse that rises at once, from a source that can give it.",
    sources: ["derivation"],
  },
  {
    id: "pedestal",
    name: "Pedestal",
    tex: String.raw`V_{ped} = \Bigl(I_b + \frac{V_{ref}}{R_{min} + a(x) R_V}\Bigr) R`,
    holds: "R as in the time constant; what the capacitor rests at between hits.",
    sources: ["derivation"],
  },
];
