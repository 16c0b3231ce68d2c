import { analyseStages, recompute, type VoiceDocument } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { expect, test } from "vitest";
import { bandPassStage } from "../../support/stages.ts";

const document: VoiceDocument = { stages: [bandPassStage("a")], links: [], conditions: {} };
const kept = () => analyseStages(document, stageKinds);

test("the same library gives the same figures", () => {
  expect(recompute(document, kept(), stageKinds)).toEqual({ differences: [], warnings: { gone: [], new: [] } });
});

test("a figure that came out otherwise is named with both values", () => {
  const older = kept();
  const { centreFrequency } = older.results.a as { centreFrequency: number };
  older.results.a = { ...older.results.a, centreFrequency: centreFrequency * 1.01 };
  expect(recompute(document, older, stageKinds).differences).toEqual([
    {
      ...{ stage: "a", name: "centreFrequency", label: "Centre frequency", unit: "Hz" },
      ...{ from: centreFrequency * 1.01, to: centreFrequency },
    },
  ]);
});

test("a last digit that another machine's arithmetic moves is no difference", () => {
  const older = kept();
  const { centreFrequency } = older.results.a as { centreFrequency: number };
  older.results.a = { ...older.results.a, centreFrequency: centreFrequency * (1 + 1e-13) };
  expect(recompute(document, older, stageKinds).differences).toEqual([]);
});

test("a figure the library no longer gives, and one it gives anew, are differences", () => {
  const older = kept();
  const { centreFrequency: _, ...rest } = older.results.a!;
  older.results.a = { ...rest, bygone: 3 };
  const names = recompute(document, older, stageKinds).differences.map(({ name }) => name);
  expect(names.sort()).toEqual(["bygone", "centreFrequency"]);
});
