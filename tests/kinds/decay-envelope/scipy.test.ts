import { describe, it } from "vitest";
import { plotStage } from "#lib/circuit/index.ts";
import { decayEnvelope } from "#lib/circuit/kinds/decay-envelope/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange, requestOf } from "../../support/limitCase.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";

const topology = decayEnvelope.topologies[0]!;

interface Given {
  rs: number;
  c: number;
  decay: number;
  load: number;
  height: number;
  width: number;
  is: number;
  n: number;
  kelvin: number;
  rest: number;
}
interface Figures {
  peak: number;
  firstCurrent: number;
  curve: [time: number, voltage: number][];
}

const changeOf = (given: Given) => ({
  parts: { rs: given.rs, c: given.c, rMin: given.decay, rPot: 0 },
  conditions: {
    loadResistance: given.load,
    pulseHeight: given.height,
    pulseWidth: given.width,
    saturationCurrent: given.is,
    emissionCoefficient: given.n,
    temperature: given.kelvin,
    controlRest: given.rest,
  },
});

describe("the diode-charged envelope against scipy's stiff integrator", () => {
  const { cases } = committed<Given, Figures>("decay_envelope");

  it.each(cases.map((one) => [one.given.id, one] as const))("charges as %s does", (_, { given, figures }) => {
    const { results } = analyseChange(topology, changeOf(given));
    expectRelative(results["peakVoltage"], figures.peak, 3e-9, "peak");
    expectRelative(results["peakChargeCurrent"], figures.firstCurrent, 1e-12, "first current");
  });

  it.each(cases.map((one) => [one.given.id, one] as const))("draws the curve of %s", (_, { given, figures }) => {
    const at = figures.curve.map(([time]) => time);
    const lines = plotStage(topology, { ...requestOf(topology, changeOf(given)), curves: ["envelope"], at });
    const now = lines.find(({ line }) => line === "now")!.points;
    for (const [i, [time, voltage]] of figures.curve.entries()) {
      const error = Math.abs(now[i]![1] - voltage) / figures.peak;
      expectRelative(1 + error, 1, 3e-9, `voltage at ${time} s`);
    }
  });

  itGivesTheCommittedFiguresAgain("decay_envelope", 1e-8);
});
