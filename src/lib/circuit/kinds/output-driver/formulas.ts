import type { Formula } from "../../stage/citation.ts";

const derived = ["driver-derivation"];

export function formulasFor(inverting: boolean): readonly Formula[] {
  return [
    {
      id: "gain",
      name: "Gain",
      tex: inverting
        ? String.raw`A = \frac{R_F}{R_i + R_s}\,\frac{1}{1 + N/A_0}`
        : String.raw`A = \left(1 + \frac{R_F}{R_i}\right)\frac{R_B}{R_B + R_s}\,\frac{1}{1 + N/A_0}`,
      holds: "In the middle of the band, at the op amp; A_0 counts only with a finite gain-bandwidth.",
      sources: derived,
    },
    {
      id: "level",
      name: "Level at the jack",
      tex: String.raw`V_o = V_i\,A\,\frac{R_L/n}{R_L/n + R_o},\quad 20\log_{10}\frac{V_o}{\sqrt{0.6}\ \mathrm V}`,
      holds: "In the middle of the band.",
      sources: derived,
    },
    {
      id: "load-loss",
      name: "Loss into the load",
      tex: String.raw`20\log_{10}\frac{R_L/n}{R_L/n + R_o}`,
      holds: "n inputs of R_L each, R_o outside the loop.",
      sources: derived,
    },
    {
      id: "swing",
      name: "Swing",
      tex: String.raw`V_\mathrm{sw} = \min(V_+, -V_-) - V_d - 1.5\ \mathrm V`,
      holds: "1.5 V is what usual op amps keep from their rails, from memory; a load of less than 10 kΩ costs more.",
      sources: ["memory"],
    },
    {
      id: "headroom",
      name: "Headroom",
      tex: String.raw`20\log_{10}\frac{V_\mathrm{sw}}{k\,V_iA},\quad k = 4\ \text{(noise)},\ \sqrt 2\ \text{(sine)}`,
      holds: "At the op amp.",
      sources: ["practice"],
    },
    {
      id: "clip-probability",
      name: "Share of time clipped",
      tex: String.raw`p = \operatorname{erfc}\!\left(\frac{V_\mathrm{sw}}{\sqrt 2\,V_iA}\right)`,
      holds: "Gaussian noise. Four standard deviations are passed 63 ppm of the time.",
      sources: derived,
    },
    {
      id: "bandwidth",
      name: "Bandwidth",
      tex: String.raw`f_3 = f_t\left(\frac1N + \frac1{A_0}\right),\quad N = 1 + \frac{R_F}{R_i${inverting ? " + R_s" : ""}}`,
      holds: "Single-pole op amp.",
      sources: ["driver-derivation", "inverting-note"],
    },
    {
      id: "cable",
      name: "Corner of the cable",
      tex: String.raw`\frac{1}{2\pi\,(R_o \parallel R_L/n)\,C_c}`,
      holds: "R_o outside the loop keeps the op amp from seeing the cable.",
      sources: derived,
    },
    {
      id: "slew",
      name: "Slew limit",
      tex: String.raw`f_\mathrm{max} = \frac{SR}{2\pi V_\mathrm{sw}}`,
      holds: "A sine at full swing.",
      sources: ["inverting-note"],
    },
    {
      id: "coupling",
      name: "Coupling corners",
      tex: inverting
        ? String.raw`f_1 = \frac{1}{2\pi (R_i + R_s) C_\mathrm{in}},\quad f_2 = \frac{1}{2\pi (R_o + R_L/n) C_\mathrm{out}}`
        : String.raw`f_1 = \frac{1}{2\pi (R_B + R_s) C_\mathrm{in}},\quad f_2 = \frac{1}{2\pi (R_o + R_L/n) C_\mathrm{out}}`,
      holds: "Each alone; the curve has both.",
      sources: derived,
    },
    {
      id: "short-circuit",
      name: "Into a short",
      tex: String.raw`I = \frac{V_\mathrm{sw}}{R_o},\quad P = \frac{V_\mathrm{sw}^2}{R_o}`,
      holds: "Unless the op amp limits the current first. A steady short at full swing.",
      sources: derived,
    },
    {
      id: "offset",
      name: "DC at the jack",
      tex: String.raw`V_\mathrm{dc} = V_{os}\,N_\mathrm{dc}\,\frac{R_L/n}{R_L/n + R_o}`,
      holds: inverting
        ? "Without bias current. N_dc is 1 behind a coupling capacitor, else N; nothing with an output capacitor."
        : "Without bias current; N_dc = N. Nothing with an output capacitor.",
      sources: derived,
    },
    {
      id: "noise-floor",
      name: "Noise floor",
      tex: String.raw`V_n = N\sqrt{e_n^2 + 4kT\,(R_F \parallel R_i)}\,\sqrt{\tfrac{\pi}{2}f_c}`,
      holds:
        "Of this stage at the op amp; without current noise, flicker noise and R_o. Signal over noise is at the jack.",
      sources: ["driver-derivation", "si"],
    },
    {
      id: "design",
      name: "Sizing",
      tex: inverting ? String.raw`R_F = A\,(R_i + R_s)` : String.raw`R_F = (A - 1)\,R_i`,
      holds: "R_o follows from the level where a load is set. A finite op amp is corrected for.",
      sources: derived,
    },
  ];
}
