import { describe, expect, it } from "vitest";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { voiceTemplates } from "#lib/circuit/kinds/templates.ts";
import { beginStages, type VoiceTemplate } from "#lib/circuit/voice/template.ts";
import { computeChain, findIn, linkFaults } from "#lib/circuit/voice/index.ts";

const find = findIn(stageKinds);
const begun = (voiceTemplates as readonly VoiceTemplate[])
  .filter(({ stages }) => stages.length > 0)
  .map((template) => [template.id, { template, stages: beginStages(template, stageKinds) }] as const);

/** What is said of the demo values on purpose: a pot that no buffer follows, and a law that is an approximation. */
const said: Record<string, string[]> = {
  "two-path-noise": ["body-amount wiper-loaded", "snap-cell approximate"],
  "struck-tone": [],
};

describe.each(begun)("the template %s", (id, { template, stages }) => {
  const { links } = template;

  it("joins its stages by links that can be soldered, none left out", () => {
    expect(linkFaults(stages, links, find)).toEqual([]);
    const joined = new Set(links.flatMap(({ from, to }) => [from.stage, to.stage]));
    expect([...joined].sort()).toEqual(stages.map((stage) => stage.id).sort());
  });

  it("gives each fitted part a designator of its own", () => {
    const all = stages.flatMap(({ designators }) => Object.values(designators));
    expect(new Set(all).size).toBe(all.length);
  });

  it("meets its targets within the chain, and says no more than it should", () => {
    const { stages: computed, unsettled } = computeChain({ stages, links, conditions: {} }, find);
    const analyses = [...computed].map(([stage, { analysis }]) => [stage, analysis] as const);
    const missed = analyses.flatMap(([stage, { state }]) =>
      Object.entries(state).flatMap(([target, one]) => (one === "within" ? [] : [`${stage} ${target} ${one}`])),
    );
    expect(missed).toEqual([]);
    expect(unsettled).toEqual([]);
    expect(analyses.flatMap(([stage, { warnings }]) => warnings.map(({ code }) => `${stage} ${code}`))).toEqual(
      said[id],
    );
  });

  it("hardly changes its figures when a stage is taken out of the chain", () => {
    const { stages: within } = computeChain({ stages, links, conditions: {} }, find);
    const apart = stages.map((stage) => ({ ...stage, apart: true }));
    const { stages: alone } = computeChain({ stages: apart, links, conditions: {} }, find);
    for (const [stage, { analysis }] of alone)
      expect(
        Object.values(analysis.state).filter((one) => one === "outside"),
        stage,
      ).toEqual([]);
    expect(alone.size).toBe(within.size);
  });
});
