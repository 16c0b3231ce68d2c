import type { Formula } from "../../stage/citation.ts";

export const sharedFormulas: readonly Formula[] = [
  {
    id: "slow-edge",
    name: "Slow edges",
    tex: String.raw`\frac{V_{peak}}{V_{step}} = \frac{\tau}{t_r}\bigl(1 - e^{-t_r/\tau}\bigr)`,
    holds:
      "A straight ramp into the differentiator, the threshold network's load included; solved for t_r where the peak just reaches the threshold.",
    sources: ["derivation"],
  },
  {
    id: "button",
    name: "Latency of the button",
    tex: String.raw`t_b = \tau_b \ln\frac{V_+}{V_+ - V_{th}}`,
    holds: "The filter charges towards the positive rail and is not loaded by the threshold network.",
    sources: ["derivation"],
  },
  {
    id: "velocity",
    name: "Peak by velocity",
    tex: String.raw`V_{pk} = (g V_{vel} - V_d)\bigl(1 - e^{-t_w/\tau_c}\bigr),\quad V_{dead} = V_d / g`,
    holds: "Fixed diode drop and no discharge while charging; the decay envelope's page computes the charge exactly.",
    sources: ["derivation"],
  },
];
