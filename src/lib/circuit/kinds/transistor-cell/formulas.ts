import type { Formula } from "../../stage/citation.ts";

export const formulas: readonly Formula[] = [
  {
    id: "average",
    name: "Output by averaging",
    tex: String.raw`V_o = \sqrt{\langle v_c^2 \rangle - \langle v_c \rangle^2},\quad \langle f \rangle = \int f(v)\,\frac{e^{-v^2/2\sigma^2}}{\sigma\sqrt{2\pi}}\,dv,\quad \frac{V' - v_c}{R_c \parallel R_o} = I_F - \Bigl(1 + \frac{1}{\beta_R}\Bigr) I_R`,
    holds:
      "Exact averages of the static transport model (I_F = I_S(e^{v_b/V_T} − 1), I_R likewise of base to collector); V′ is the envelope behind the divider of R_c and R_o, whose far end C_o holds at the mean. No charge storage, no Early effect: an approximation of a real part.",
    sources: ["derivation", "transport"],
  },
  {
    id: "self-bias",
    name: "Self-bias",
    tex: String.raw`\Bigl\langle \frac{v_b}{R_b} + \frac{I_F}{\beta} + \frac{I_R}{\beta_R} \Bigr\rangle = 0`,
    holds: "Once C_i has settled, which takes several times R_i·C_i; its voltage V_cap shifts the drive.",
    sources: ["derivation"],
  },
  {
    id: "law",
    name: "Simple law",
    tex: String.raw`V_{o,0} = (V_{env} - 0.05)\sqrt{d(1 - d)},\quad d_0 = P(v > V_{on} + V_{cap}),\quad V_{on} = V_{BE} + \Bigl(\frac{V_{env}}{2 R_c \beta} + \frac{V_{BE}}{R_b}\Bigr) R_i`,
    holds: "Large drive, instant edges, no load by R_o; d is the averaged share of the time on. Its error is shown.",
    sources: ["derivation", "practice"],
  },
  {
    id: "envelope-load",
    name: "Load on the envelope",
    tex: String.raw`R_{env} = \frac{V_{env}}{(V_{env} - \langle v_c \rangle)/R_c} \approx \frac{R_c}{d}`,
    holds: "The mean current; it falls with the envelope, so an unbuffered decay is no exponential.",
    sources: ["derivation"],
  },
  {
    id: "corners",
    name: "Corners",
    tex: String.raw`f_i = \frac{1}{2\pi C_i (R_i + R_b)},\quad f_o = \frac{1}{2\pi C_o (R_c + R_o)}`,
    holds: "The transistor off.",
    sources: ["derivation"],
  },
];
