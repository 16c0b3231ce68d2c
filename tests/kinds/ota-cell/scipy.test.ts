import { describe, expect, it } from "vitest";
import { analyseStage, defaultParts } from "#lib/circuit/index.ts";
import { otaCell } from "#lib/circuit/kinds/ota-cell/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { hasScipy, rerunScipy, scipyReference } from "../../support/scipyReference.ts";

interface Given {
  rin: number;
  rsh: number;
  id_: number;
  t: number;
  sine: number;
  noise: number;
}
interface Figures {
  shareAtPeak: number;
  sineDistortion: number;
  sineCompressionDb: number;
  noiseDistortion: number;
  noiseCompressionDb: number;
}

const committed = scipyReference<Given, Figures>("ota_cell");
const topology = otaCell.topologies[0]!;

describe("distortion against Kirchhoff's laws and integrals by scipy", () => {
  it.each(committed.cases.map((one) => [one.given.id, one] as const))("agrees for %s", (id, { given, figures }) => {
    const { rin, rsh, id_, t } = given;
    const at = (conditions: Record<string, number | string>) =>
      analyseStage(topology, {
        parts: { ...defaultParts(topology), rin, rsh },
        conditions: { diodeCurrent: id_, temperature: t, ...conditions },
      }).results as Record<string, number>;
    const sine = at({ sourcePeak: given.sine });
    expectRelative(sine.outputPeak! / sine.ceiling!, figures.shareAtPeak, 1e-10, `${id} share`);
    expectRelative(sine.distortion, figures.sineDistortion, 1e-8, `${id} sine`);
    // The script's small-signal slope is a difference quotient.
    expect(sine.compressionDb, `${id} sine compression`).toBeCloseTo(figures.sineCompressionDb, 7);
    const noise = at({ signal: "noise", sourceRms: given.noise });
    expectRelative(noise.distortion, figures.noiseDistortion, 1e-8, `${id} noise`);
    expect(noise.compressionDb, `${id} noise compression`).toBeCloseTo(figures.noiseCompressionDb, 7);
  });

  it.runIf(hasScipy)("finds the committed figures again", { timeout: 60_000 }, async () => {
    const again = await rerunScipy<Given, Figures>("ota_cell");
    for (const [k, { given, figures }] of again.cases.entries())
      for (const [key, value] of Object.entries(figures))
        expectRelative(value, committed.cases[k]!.figures[key as keyof Figures], 1e-7, `${given.id} ${key}`);
  });
});
