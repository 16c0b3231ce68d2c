import { defineStageKind } from "../../stage/kind.ts";
import { defineTopology } from "../../stage/topology.ts";
import { analyse, design } from "./analyse.ts";
import { curves } from "./curves.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { joints, junctionDraw } from "./joints.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";
import { reference } from "./reference.ts";
import { sources } from "./sources.ts";

const measured = defineTopology({
  id: "measured",
  name: "Measured junction, amplified",
  summary: "A junction in breakdown, as loud as it was measured, and two stages of gain.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [],
  curves,
  limits,
  formulas,
  sources,
  network,
  joints,
  draws: junctionDraw,
  devices: [
    { key: "q1", letter: "Q", label: "noise junction", deviceClass: "general-purpose NPN, selected" },
    { key: "u1", letter: "U", label: "first stage", deviceClass: "JFET-input op amp, one of two in a package" },
    { key: "u2", letter: "U", label: "second stage", deviceClass: "JFET-input op amp, one of two in a package" },
  ],
  traits: [
    { label: "Op amps", text: "two" },
    { label: "Level", text: "measured; 6 dB either way from device to device" },
    { label: "Needs", text: "a rail 3 V above breakdown, behind an RC of its own" },
    { label: "Inverts", text: "no" },
  ],
  leavesOut: [
    "how loud a junction is, and how that moves with current, temperature and age",
    "flicker noise, the op amps' current noise and second poles",
    "the load of the stage behind",
    "the spectrum of a shift register",
  ],
});

export const noiseSource = defineStageKind({
  id: "noise-source",
  name: "Noise source",
  summary: "White noise of a known level, and what a band-pass leaves of it.",
  place: "audio",
  ports: [{ id: "out", label: "noise out", sort: "audio", direction: "out" }],
  topologies: [measured],
  telling: ["rms", "peak4Sigma"],
  reference,
  version: 1,
});
