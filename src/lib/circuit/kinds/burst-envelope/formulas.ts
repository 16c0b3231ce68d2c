import type { Formula } from "../../stage/citation.ts";

export const formulas: readonly Formula[] = [
  {
    id: "period",
    name: "Spacing",
    tex: String.raw`t_h = R_T C_T \ln\frac{V_{oh} - \beta V_{ol}}{V_{oh} - \beta V_{oh}},\quad t_l = R_T C_T \ln\frac{V_{ol} - \beta V_{oh}}{V_{ol} - \beta V_{ol}},\quad T = t_h + t_l,\quad \beta = \frac{R_1}{R_1 + R_2}`,
    holds:
      "Exact for an ideal comparator; with equal swings T = 2 R_T C_T ln((1 + β)/(1 − β)). A bias current lowers both voltages that the capacitor heads for by I_b·R_T.",
    sources: ["derivation", "relaxation"],
  },
  {
    id: "first",
    name: "First interval",
    tex: String.raw`T_1 = R_T C_T \ln\frac{V_{oh} - V_0}{V_{oh} - \beta V_{oh}} + t_l`,
    holds: "The capacitor rests at V_0 when the gate opens.",
    sources: ["derivation"],
  },
  {
    id: "gate",
    name: "Gate",
    tex: String.raw`T_g = R_G C_G \ln\frac{V_s}{V_{th}}`,
    holds: "The gate's capacitor empties from V_s to V_th; nothing loads it.",
    sources: ["derivation"],
  },
  {
    id: "count",
    name: "Hits",
    tex: String.raw`N = \Bigl\lfloor \frac{T_g - T_1}{T} \Bigr\rfloor + 2,\quad t_k = 0,\ T_1,\ T_1 + T,\ \dots`,
    holds: "Exact; 1 where the gate is shorter than the first interval.",
    sources: ["derivation"],
  },
  {
    id: "worst-case",
    name: "Hits at worst case",
    tex: String.raw`\frac{T_g}{T} \to \frac{T_g}{T}\,(1 + e)^{\pm 1},\quad 1 + e = \frac{(1 + t_R)(1 + t_C)}{(1 - t_R)(1 - t_C)}`,
    holds: "Parts of gate and spacing at opposite ends of their tolerances; thresholds do not stray.",
    sources: ["derivation"],
  },
  {
    id: "valley",
    name: "Valley",
    tex: String.raw`20 \log_{10} e^{-T/\tau_b},\quad \tau_b = R_B C_B`,
    holds: "Each hit charges fully; the tail has not begun.",
    sources: ["derivation"],
  },
  {
    id: "tail",
    name: "Tail",
    tex: String.raw`t_{60} = 3 \ln 10 \cdot R_L C_L`,
    holds: "Without load on the capacitor.",
    sources: ["derivation"],
  },
];
