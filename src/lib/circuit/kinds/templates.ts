import type { VoiceTemplate } from "../voice/template.ts";

/** What a new voice can begin with. Stands beside the registry, since a template is made of kinds. */
export const voiceTemplates = [
  {
    id: "two-path-noise",
    name: "Two-path noise",
    summary: "Noise through a band-pass, split into two gated paths.",
    stages: [
      {
        id: "body-band",
        name: "Band of the body",
        kind: "band-pass",
        topology: "multiple-feedback",
        targets: { centreFrequency: 1800, qualityFactor: 3, peakGain: 2 },
        parts: { ra: 13.3e3, rb: 1650, rf: 53.6e3, c1: 10e-9, c2: 10e-9 },
      },
    ],
    links: [],
  },
  {
    id: "struck-tone",
    name: "Struck tone",
    summary: "A resonator that rings when it is struck.",
    stages: [
      {
        id: "resonator",
        name: "Resonator",
        kind: "band-pass",
        topology: "multiple-feedback",
        targets: { centreFrequency: 180, qualityFactor: 8, peakGain: 1 },
        parts: { ra: 71.5e3, rb: 562, rf: 143e3, c1: 100e-9, c2: 100e-9 },
      },
    ],
    links: [],
  },
  { id: "empty", name: "Empty", summary: "Nothing yet.", stages: [], links: [] },
] as const satisfies readonly VoiceTemplate[];

export type VoiceTemplateId = (typeof voiceTemplates)[number]["id"];
