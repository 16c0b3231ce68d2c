import type { LimitCase } from "../../support/limitCase.ts";

const topology = "multiple-feedback";
const withPot = { rb: 2200, rbPot: 2000 };

/** Each limit of trade brief 2.7 from both sides, as near to its bound as is clear. */
const multipleFeedback: readonly LimitCase[] = [
  {
    topology,
    code: "oscillates",
    // A gain-bandwidth far below the centre, behind a large output resistance, leaves no peak to read.
    raised: { conditions: { gainBandwidth: 500, outputResistance: 1e6 } },
    quiet: { conditions: { gainBandwidth: 3e6, outputResistance: 100 } },
  },
  {
    topology,
    code: "gain-near-limit",
    raised: { parts: { ra: 22e3, rb: 221e3 } },
    quiet: { parts: { ra: 22e3, rb: 219e3 } },
  },
  {
    topology,
    code: "slow-op-amp",
    raised: { conditions: { gainBandwidth: 300e3 } },
    quiet: { conditions: { gainBandwidth: 500e3 } },
  },
  {
    topology,
    code: "little-loop-gain",
    raised: { conditions: { gainBandwidth: 500e3 } },
    quiet: { conditions: { gainBandwidth: 700e3 } },
  },
  { topology, code: "small-resistor-to-ground", raised: { parts: { rb: 99 } }, quiet: { parts: { rb: 100 } } },
  { topology, code: "large-feedback-resistor", raised: { parts: { rf: 1.01e6 } }, quiet: { parts: { rf: 1e6 } } },
  {
    topology,
    code: "capacitor-near-stray",
    raised: { parts: { c1: 10e-9, c2: 219e-12 } },
    quiet: { parts: { c1: 220e-12, c2: 220e-12 } },
  },
  {
    topology,
    code: "source-loads-input",
    raised: { parts: { ra: 22e3 }, conditions: { sourceResistance: 441 } },
    quiet: { parts: { ra: 22e3 }, conditions: { sourceResistance: 440 } },
  },
  {
    topology,
    code: "class-2-ceramic",
    raised: { conditions: { dielectric: "class-2" } },
    quiet: { conditions: { dielectric: "film-or-class-1" } },
  },
  // With next to nothing left of R_B the peak would lie far above what so slow an op amp follows.
  {
    topology,
    code: "no-centre-at-pot-end",
    raised: { parts: { rb: 10, rbPot: 50e3 }, conditions: { gainBandwidth: 100e3, outputResistance: 1e3 } },
    quiet: { parts: { rb: 1e3, rbPot: 50e3 }, conditions: { gainBandwidth: 3e6, outputResistance: 1e3 } },
  },
  {
    topology,
    code: "retune-misses-target",
    // Every board reaches 938.4 to 1061.2 Hz (mfb.bot_wc and mfb.top_wc of the worked values).
    raised: { parts: withPot, targets: { centreFrequency: 1062 } },
    quiet: { parts: withPot, targets: { centreFrequency: 1061 } },
  },
  {
    topology,
    code: "retune-misses-target",
    raised: { parts: withPot, targets: { centreFrequency: 938 } },
    quiet: { parts: withPot, targets: { centreFrequency: 939 } },
  },
  {
    topology,
    code: "retune-misses-target",
    // Tolerances wider than the pot's range leave no centre that every board reaches.
    raised: { parts: withPot, conditions: { capacitorTolerance: 0.2 }, targets: { centreFrequency: 1000 } },
    quiet: { parts: { rbPot: 0 }, conditions: { capacitorTolerance: 0.2 }, targets: { centreFrequency: 1000 } },
  },
  {
    topology,
    code: "output-clips",
    raised: { conditions: { sourceRms: 10, sourceBandwidth: 20e3 } },
    quiet: { conditions: { sourceRms: 8, sourceBandwidth: 20e3 } },
  },
  {
    topology,
    code: "heavy-load",
    raised: { conditions: { loadResistance: 9.9e3 } },
    quiet: { conditions: { loadResistance: 10e3 } },
  },
];

/** Limits that the networks with an op amp at the output share, and an input resistor each. */
const shared = (topology: string, input: string, resistance: number): LimitCase[] => [
  {
    topology,
    code: "capacitor-near-stray",
    raised: { parts: { c1: 219e-12 } },
    quiet: { parts: { c1: 220e-12, c2: 220e-12 } },
  },
  {
    topology,
    code: "class-2-ceramic",
    raised: { conditions: { dielectric: "class-2" } },
    quiet: { conditions: { dielectric: "film-or-class-1" } },
  },
  {
    topology,
    code: "output-clips",
    raised: { conditions: { sourceRms: 10 } },
    quiet: { conditions: { sourceRms: 1 } },
  },
  {
    topology,
    code: "heavy-load",
    raised: { conditions: { loadResistance: 9.9e3 } },
    quiet: { conditions: { loadResistance: 10e3 } },
  },
  {
    topology,
    code: "source-loads-input",
    raised: { parts: { [input]: resistance }, conditions: { sourceResistance: 0.0201 * resistance } },
    quiet: { parts: { [input]: resistance }, conditions: { sourceResistance: 0.02 * resistance } },
  },
];

const sallenKey: readonly LimitCase[] = [
  { topology: "sallen-key", code: "oscillates", raised: { parts: { rf: 30e3 } }, quiet: { parts: { rf: 29e3 } } },
  // Equal parts: Q = √2/(4 − K) is 5 at K = 3.71716 (sk.K_Q5 of the worked values).
  {
    topology: "sallen-key",
    code: "quality-out-of-hand",
    raised: { parts: { rf: 27.172e3 } },
    quiet: { parts: { rf: 27.171e3 } },
  },
  {
    topology: "sallen-key",
    code: "quality-strays",
    raised: { parts: { rf: 25.29e3 } },
    quiet: { parts: { rf: 25.28e3 } },
  },
  {
    topology: "sallen-key",
    code: "quality-strays",
    raised: { parts: { rf: 26e3 }, conditions: { resistorTolerance: 0.01 } },
    quiet: { parts: { rf: 26e3 }, conditions: { resistorTolerance: 0.001 } },
  },
  {
    topology: "sallen-key",
    code: "tolerance-reaches-oscillation",
    raised: { parts: { rf: 29.5e3 } },
    quiet: { parts: { rf: 29e3 } },
  },
  {
    topology: "sallen-key",
    code: "retune-moves-quality",
    raised: { parts: { r2Pot: 2e3 } },
    quiet: { parts: { r2Pot: 500 } },
  },
  {
    topology: "sallen-key",
    code: "slow-op-amp",
    raised: { conditions: { gainBandwidth: 410e3 } },
    quiet: { conditions: { gainBandwidth: 425e3 } },
  },
  {
    topology: "sallen-key",
    code: "retune-misses-target",
    raised: { parts: { r2Pot: 1e3 }, targets: { centreFrequency: 1030 } },
    quiet: { parts: { r2Pot: 1e3 }, targets: { centreFrequency: 1015 } },
  },
  // Far from the other resistors the pot takes the damping away.
  {
    topology: "sallen-key",
    code: "no-centre-at-pot-end",
    raised: { parts: { r2: 4.7e3, r2Pot: 50e3 }, conditions: { rotation: 0.4 } },
    quiet: { parts: { r2: 4.7e3, r2Pot: 10e3 }, conditions: { rotation: 0.4 } },
  },
  ...shared("sallen-key", "r1", 22e3),
];

const fittedGangs = { r1Pot: 10e3, r2Pot: 10e3 };
const twoIntegrator: readonly LimitCase[] = [
  {
    topology: "two-integrator",
    code: "oscillates",
    raised: { parts: { rq1: 10e6 }, conditions: { gainBandwidth: 500e3 } },
    quiet: { parts: { rq1: 82e3 }, conditions: { gainBandwidth: 500e3 } },
  },
  // At the end of the pot the centre lies near 16 kHz: five times that over 200 kHz is more damping than there is.
  {
    topology: "two-integrator",
    code: "no-centre-at-pot-end",
    raised: { parts: { r1: 1e3, r2: 1e3, r1Pot: 50e3, r2Pot: 50e3 }, conditions: { gainBandwidth: 200e3 } },
    quiet: { parts: { r1: 1e3, r2: 1e3, r1Pot: 50e3, r2Pot: 50e3 }, conditions: { gainBandwidth: 500e3 } },
  },
  // 5·Q·f0 of the parts it starts with is 15.25 kHz.
  {
    topology: "two-integrator",
    code: "slow-op-amps",
    raised: { conditions: { gainBandwidth: 304e3 } },
    quiet: { conditions: { gainBandwidth: 306e3 } },
  },
  {
    topology: "two-integrator",
    code: "op-amps-too-slow",
    raised: { conditions: { gainBandwidth: 30.4e3 } },
    quiet: { conditions: { gainBandwidth: 30.6e3 } },
  },
  {
    topology: "two-integrator",
    code: "gang-mismatch",
    raised: { parts: fittedGangs, conditions: { gangMismatch: 3.1 } },
    quiet: { parts: fittedGangs, conditions: { gangMismatch: 3 } },
  },
  {
    topology: "two-integrator",
    code: "gangs-unequal",
    raised: { parts: { r1Pot: 10e3 } },
    quiet: { parts: fittedGangs },
  },
  {
    topology: "two-integrator",
    code: "inner-output-clips",
    raised: { conditions: { sourceRms: 3 } },
    quiet: { conditions: { sourceRms: 2 } },
  },
  {
    topology: "two-integrator",
    code: "retune-misses-target",
    raised: { parts: fittedGangs, targets: { centreFrequency: 600 } },
    quiet: { parts: fittedGangs, targets: { centreFrequency: 620 } },
  },
  ...shared("two-integrator", "ri", 10e3),
];

const bridgedT: readonly LimitCase[] = [
  // Equal capacitors: Q = ½·√(R2/R1).
  { topology: "bridged-t", code: "does-not-ring", raised: { parts: { r2: 0.99e3 } }, quiet: { parts: { r2: 1.01e3 } } },
  {
    topology: "bridged-t",
    code: "large-bridge-resistor",
    raised: { parts: { r2: 1.01e6 } },
    quiet: { parts: { r2: 1e6 } },
  },
  { topology: "bridged-t", code: "small-leg-resistor", raised: { parts: { r1: 99 } }, quiet: { parts: { r1: 100 } } },
  // 10 V for 1 ms reach 12.57 V.
  {
    topology: "bridged-t",
    code: "ring-clips",
    raised: { conditions: { strikeVoltage: 8.36 } },
    quiet: { conditions: { strikeVoltage: 8.35 } },
  },
  {
    topology: "bridged-t",
    code: "strike-too-long",
    raised: { conditions: { strikeWidth: 2.19e-3 } },
    quiet: { conditions: { strikeWidth: 2.18e-3 } },
  },
  {
    topology: "bridged-t",
    code: "slow-op-amp",
    raised: { conditions: { gainBandwidth: 350e3 } },
    quiet: { conditions: { gainBandwidth: 365e3 } },
  },
  {
    topology: "bridged-t",
    code: "quality-near-buzzing",
    raised: { parts: { r1: 277 } },
    quiet: { parts: { r1: 278 } },
  },
  {
    topology: "bridged-t",
    code: "retune-misses-target",
    raised: { parts: { r1Pot: 1e3 }, targets: { centreFrequency: 160 } },
    quiet: { parts: { r1Pot: 1e3 }, targets: { centreFrequency: 163 } },
  },
  ...shared("bridged-t", "rin", 1e6),
];

const passive: readonly LimitCase[] = [
  {
    topology: "passive",
    code: "quality-impossible",
    raised: { conditions: { qualityWanted: 0.5 } },
    quiet: { conditions: { qualityWanted: 0.49, sourceRms: 1 } },
  },
  {
    topology: "passive",
    code: "load-too-low",
    raised: { conditions: { loadResistance: 469e3 } },
    quiet: { conditions: { loadResistance: 470e3 } },
  },
  {
    topology: "passive",
    code: "source-loads-input",
    raised: { conditions: { sourceResistance: 471 } },
    quiet: { conditions: { sourceResistance: 470 } },
  },
  ...shared("passive", "r1", 4700).filter(({ code }) => code === "capacitor-near-stray" || code === "class-2-ceramic"),
];

export const limitCases: readonly LimitCase[] = [
  ...multipleFeedback,
  ...sallenKey,
  ...twoIntegrator,
  ...bridgedT,
  ...passive,
];
