import { checkVoice, computeChain, levelsOf, supplyOf, type Chain } from "#lib/circuit/voice/index.ts";
import { describe, expect, test } from "vitest";
import { find, linksOf, stageOf, twoPaths } from "../../support/chains.ts";

function itemsOf(chain: Chain) {
  const computed = computeChain(chain, find);
  return checkVoice(computed, find, supplyOf(computed), chain.accepted);
}
const codesOf = (chain: Chain, stage?: string) =>
  itemsOf(chain).flatMap((item) => (stage === undefined || item.stage === stage ? [item.code] : []));
const changed = (chain: Chain, id: string, change: Partial<Chain["stages"][number]>): Chain => ({
  ...chain,
  stages: chain.stages.map((stage) => (stage.id === id ? { ...stage, ...change } : stage)),
});
const withConditions = (conditions: Chain["conditions"]): Chain => ({ ...twoPaths(), conditions });

/** The two-path voice with its driver set to give rack level. */
function atRackLevel(): Chain {
  const rms = levelsOf(computeChain(twoPaths(), find)).find(({ jack }) => jack)!.rms;
  const driver = twoPaths().stages.find(({ id }) => id === "driver")!;
  return changed(twoPaths(), "driver", { parts: { ...driver.parts, rf: (driver.parts.rf! * 1.25) / rms } });
}

describe("the list of what is not right", () => {
  test("of nothing is empty", () => {
    expect(itemsOf({ stages: [], links: [], conditions: {} })).toEqual([]);
  });

  test("opens with the worst, and names stage, code and words", () => {
    const items = itemsOf(twoPaths());
    const rank = { fault: 0, caution: 1, note: 2 };
    const ranks = items.map(({ severity }) => rank[severity]);
    expect(ranks).toEqual([...ranks].sort());
    for (const { message, code } of items) {
      expect(message).toMatch(/[.!?]$/);
      expect(message, code).not.toMatch(/NaN|undefined|Infinity/);
    }
  });

  test.each<[string, string, Chain, Chain]>([
    ["unlinked-port", "driver", { ...twoPaths(), links: twoPaths().links.slice(0, -1) }, twoPaths()],
    ["set-apart", "band", changed(twoPaths(), "band", { apart: true }), twoPaths()],
    [
      "not-fitted",
      "band",
      changed(twoPaths(), "band", { notFitted: ["c1"] }),
      changed(twoPaths(), "band", { notFitted: ["rbPot"] }),
    ],
    ["unknown-network", "band", changed(twoPaths(), "band", { kind: "unheard-of" }), twoPaths()],
    [
      "duplicate-R1",
      "band",
      changed(changed(twoPaths(), "band", { designators: { ra: "R1" } }), "amount", { designators: { rPot: "R1" } }),
      twoPaths(),
    ],
    [
      "typical-figures",
      "driver",
      changed(twoPaths(), "driver", { conditions: { slewRate: 13e6 } }),
      changed(twoPaths(), "driver", { conditions: { slewRate: 12e6 } }),
    ],
    ["overdriven", "cell", twoPaths(), changed(twoPaths(), "noise", { conditions: { rms: 1 } })],
    [
      "jack-level",
      "driver",
      changed(twoPaths(), "driver", { parts: { ...twoPaths().stages.at(-1)!.parts, rf: 1e3 } }),
      atRackLevel(),
    ],
    [
      "unfitted-in3",
      "sum",
      {
        ...twoPaths(),
        links: [...twoPaths().links, ...linksOf("band.out > sum.in3").map((link) => ({ ...link, id: "x" }))],
      },
      twoPaths(),
    ],
  ])("%s is raised at %s, and not without its reason", (code, stage, raised, quiet) => {
    expect(codesOf(raised, stage)).toContain(code);
    expect(codesOf(quiet, stage)).not.toContain(code);
  });

  test.each<[string, Chain["conditions"], Chain["conditions"]]>([
    ["no-reverse-protection", {}, { seriesElement: "schottky" }],
    ["header-open", { header: "open" }, {}],
    ["positive-allowance", { currentAllowance: 1e-3 }, { currentAllowance: 0.2 }],
    ["positive-drop", { seriesResistance: 100 }, { seriesResistance: 10 }],
    ["droop", { seriesElement: "none" }, { bulkCapacitance: 470e-6 }],
  ])("%s is raised for the whole voice", (code, raised, quiet) => {
    expect(codesOf(withConditions(raised), "")).toContain(code);
    expect(codesOf(withConditions(quiet), "")).not.toContain(code);
  });

  test("a target missed because of a neighbour says so", () => {
    const stage = changed(twoPaths(), "band", { targets: { peakGain: 2.27 } });
    expect(itemsOf(stage).find(({ code }) => code === "target-peakGain")).toMatchObject({
      fromNeighbours: true,
      stage: "band",
    });
    const own = changed(twoPaths(), "band", { targets: { peakGain: 8 } });
    expect(itemsOf(own).find(({ code }) => code === "target-peakGain")?.fromNeighbours).toBe(undefined);
  });

  test("paths that subtract are called out, and not once one is turned round", () => {
    const even = (links: string[]): Chain => ({
      stages: [
        stageOf("noise", "test-noise", "white"),
        stageOf("turn", "output-driver", "inverting"),
        stageOf("again", "output-driver", "inverting"),
        stageOf("sum", "summing-node", "inverting"),
      ],
      links: linksOf(...links),
      conditions: {},
    });
    const against = ["noise.out > turn.in", "noise.out > sum.in1", "turn.out > sum.in2"];
    expect(codesOf(even(against), "sum")).toContain("paths-subtract");
    const alike = ["noise.out > turn.in", "turn.out > again.in", "noise.out > sum.in1", "again.out > sum.in2"];
    expect(codesOf(even(alike), "sum")).not.toContain("paths-subtract");
  });

  test("what clips at one end of a knob names the knob and the end", () => {
    const loud = changed(twoPaths(), "noise", { conditions: { rms: 10 } });
    const quiet = changed(loud, "amount", { conditions: { rotation: 0.01 } });
    const item = itemsOf(quiet).find(({ code, stage }) => code === "headroom" && stage === "driver");
    expect(item?.message).toContain("Pot rotation of amount at its high end");
  });

  test("what was accepted stays, with its reason, after what was not", () => {
    const accepted = [{ stage: "", code: "no-reverse-protection", reason: "Keyed, and a bench supply", by: "Ana" }];
    const items = itemsOf({ ...twoPaths(), accepted });
    expect(items.find(({ code }) => code === "no-reverse-protection")!.accepted).toEqual({
      reason: "Keyed, and a bench supply",
      by: "Ana",
    });
    const cautions = items.filter(({ severity }) => severity === "caution");
    expect(cautions.at(-1)!.code).toBe("no-reverse-protection");
  });
});
