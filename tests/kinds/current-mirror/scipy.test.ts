import { describe, expect, it } from "vitest";
import { analyseStage } from "#lib/circuit/index.ts";
import { currentMirror } from "#lib/circuit/kinds/current-mirror/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { hasScipy, rerunScipy, scipyReference } from "../../support/scipyReference.ts";

interface Given {
  topology: string;
  iref: number;
  beta: number;
  va: number;
  vout: number;
  n?: number;
  dv?: number;
  t?: number;
  rs?: number;
  r1?: number;
  r2?: number;
}
interface Figures {
  outputCurrent: number;
  baseEmitterVoltage: number;
  outputResistance: number;
}

const committed = scipyReference<Given, Figures>("current_mirror");

describe("mirrors against Kirchhoff's current law solved by scipy", () => {
  it.each(committed.cases.map((one) => [one.given.id, one] as const))("agrees for %s", (id, { given, figures }) => {
    const topology = currentMirror.topologies.find((one) => one.id === given.topology)!;
    const { results } = analyseStage(topology, {
      parts: given.r1 === undefined ? {} : { r1: given.r1, r2: given.r2! },
      conditions: {
        referenceCurrent: given.iref,
        beta: given.beta,
        earlyVoltage: given.va,
        outputVoltage: given.vout,
        ...(given.n !== undefined && { outputs: given.n }),
        mismatchVoltage: given.dv ?? 0,
        temperature: given.t ?? 298.15,
        seriesResistance: given.rs ?? 0,
      },
    });
    expectRelative(results.outputCurrent, figures.outputCurrent, 1e-9, `${id} output current`);
    expectRelative(results.baseEmitterVoltage, figures.baseEmitterVoltage, 1e-9, `${id} base-emitter voltage`);
    // The script's slope is a difference of two solutions and has fewer good digits.
    expectRelative(results.outputResistance, figures.outputResistance, 1e-6, `${id} output resistance`);
  });

  it.runIf(hasScipy)("finds the committed figures again", { timeout: 60_000 }, async () => {
    const again = await rerunScipy<Given, Figures>("current_mirror");
    expect(again.cases.map(({ given }) => given)).toEqual(committed.cases.map(({ given }) => given));
    for (const [k, { given, figures }] of again.cases.entries()) {
      expectRelative(figures.outputCurrent, committed.cases[k]!.figures.outputCurrent, 1e-10, given.id);
      expectRelative(figures.outputResistance, committed.cases[k]!.figures.outputResistance, 1e-6, given.id);
    }
  });
});
