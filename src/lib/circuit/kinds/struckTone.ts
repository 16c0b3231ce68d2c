import { linked, type VoiceTemplate } from "../voice/template.ts";

const opAmp = { gainBandwidth: 3e6 };

/** A short pulse strikes a resonator, which rings into the jack. */
export const struckTone = {
  id: "struck-tone",
  name: "Struck tone",
  summary: "A resonator that rings when it is struck.",
  stages: [
    {
      id: "trigger",
      name: "Trigger",
      kind: "trigger-input",
      topology: "transistor-threshold",
      targets: { threshold: 1.9, pulseWidth: 0.2e-3 },
      // Far shorter than one swing of the resonator, so that velocity alone sets how hard it is struck.
      parts: { cd: 3.3e-9 },
      conditions: { velocity: 5, velocityGain: 1.9 },
    },
    {
      id: "resonator",
      name: "Resonator",
      kind: "band-pass",
      topology: "bridged-t",
      targets: { centreFrequency: 180, ringTime60: 0.25 },
      parts: { r1: 470, r2: 750e3, rin: 1e6, c1: 47e-9, c2: 47e-9 },
      conditions: { ...opAmp, strikeVoltage: 9.5, strikeWidth: 0.19e-3 },
    },
    {
      id: "output",
      name: "Output",
      kind: "output-driver",
      topology: "inverting",
      targets: { gain: 2, level: 2 },
      parts: { cin: 1e-6 },
      conditions: {
        ...opAmp,
        signal: "sine",
        sourceRms: 1,
        slewRate: 13e6,
        inputNoise: 18e-9,
        loadResistance: 100e3,
      },
    },
  ],
  links: linked(["trigger.out", "resonator.strike"], ["resonator.out", "output.in"]),
} as const satisfies VoiceTemplate;
