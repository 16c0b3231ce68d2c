/** A stage as a screen saves it. */
export function bandPassStage(id: string, designators: Record<string, string> = {}) {
  return {
    id,
    kind: "band-pass",
    topology: "multiple-feedback",
    name: `Band ${id}`,
    parts: { ra: 22000, rb: 2200, rbPot: 0, rf: 100000, c1: 1e-8, c2: 1e-8 },
    conditions: {},
    targets: { centreFrequency: 1000, qualityFactor: 3, peakGain: 2 },
    designators,
  };
}

export const emptyDocument = { format: 1 as const, stages: [], links: [], conditions: {} };
