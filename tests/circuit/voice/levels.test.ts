import {
  computeChain,
  firstToClip,
  levelRanges,
  levelsAtKnobEnds,
  levelsOf,
  meetingsOf,
  type Chain,
} from "#lib/circuit/voice/index.ts";
import type { AudioSignal } from "#lib/circuit/stage/signal.ts";
import { describe, expect, test } from "vitest";
import { worked } from "../../support/published.ts";
import { find, linksOf, stageOf, twoPaths } from "../../support/chains.ts";

// A pot so small that the stage behind it does not notice it, as the worked set takes its pots.
const share = (id: string, rotation: number) =>
  stageOf(id, "trim", "divider", { parts: { rTop: 0, rPot: 0.1, rBottom: 0 }, conditions: { rotation } });

/** The worked set of a two-path voice: source, pot, band-pass, pot and amplifier cell; gain and transistor cell; sum; driver. */
function workedVoice(booster: "inverting" | "non-inverting"): Chain {
  const gain = worked("lvl.sw_gain_needed");
  const rc = 10e3;
  return {
    stages: [
      stageOf("noise", "test-noise", "white"),
      share("amount", worked("lvl.pot")),
      stageOf("band", "band-pass", "multiple-feedback", {
        parts: { ra: 22e3, rb: 3200, rf: 100e3, c1: 1e-8, c2: 1e-8 },
      }),
      share("level", 0.8),
      stageOf("cell", "ota-cell", "transimpedance", { conditions: { biasCurrent: 500e-6 } }),
      stageOf("boost", "output-driver", booster, {
        parts: { ri: 10e3, rf: 10e3 * (booster === "inverting" ? gain : gain - 1), ro: 1e-1 },
      }),
      stageOf("switch", "transistor-cell", "swing", {
        parts: { rc, ro: 1e10, co: 1e-5 },
        conditions: { controlVoltage: 8 },
      }),
      // The collector resistor stands in series with the second path's own.
      stageOf("sum", "summing-node", "inverting", { parts: { r1: 22e3, r2: 220e3 - rc, rf: 22e3 } }),
      stageOf("driver", "output-driver", "inverting", {
        parts: { ri: 10e3, rf: 10e3 * worked("lvl.gain_to_1p25") },
        conditions: { elementDrop: 0.3 },
      }),
    ],
    links: linksOf(
      "noise.out > amount.soundIn",
      "amount.soundOut > band.in",
      "band.out > level.soundIn",
      "level.soundOut > cell.in",
      "band.out > boost.in",
      "boost.out > switch.in",
      "cell.out > sum.in1",
      "switch.out > sum.in2",
      "sum.out > driver.in",
    ),
    conditions: {},
  };
}

describe("the worked set of the level plan", () => {
  const plan = (booster: "inverting" | "non-inverting") => {
    const computed = computeChain(workedVoice(booster), find);
    const levels = new Map(levelsOf(computed).map((level) => [level.node, level]));
    /** A stage's level without the load of what follows, as the worked set counts. */
    const open = (id: string) => (computed.stages.get(id)!.gives.out as AudioSignal).rms;
    return { computed, open, at: (node: string) => levels.get(node)! };
  };
  const same = plan("non-inverting");
  const close = (value: number, key: string, tolerance = 2e-4) =>
    expect(Math.abs(value / worked(key) - 1), `${key}: ${value}`).toBeLessThan(tolerance);

  test("comes out node by node", () => {
    close(same.at("noise.out").rms, "lvl.src", 1e-9);
    close(same.at("band.out").rms, "lvl.bp", 1e-5);
    close(same.at("band.out").peak, "lvl.bp_pk", 1e-5);
    close(same.at("level.soundOut").rms, "lvl.ota_in", 1e-5);
    close(same.at("cell.out: behind the divider").rms * 1e3, "lvl.vd_mV", 1e-5);
    expect(same.at("cell.out: behind the divider").most).toBe(10e-3);
    // The level carries the distortion too, which the worked figure leaves out: 4.5e-5 of the power.
    close(same.at("cell.out").rms, "lvl.ota_out", 5e-5);
    const { distortionDb, compressionDb } = same.computed.stages.get("cell")!.analysis.results;
    close(distortionDb as number, "lvl.ota_dist_dB", 1e-4);
    close(compressionDb as number, "lvl.ota_comp_dB", 1e-3);
    close(same.at("boost.out").rms, "lvl.sw_gain_needed", 1);
    expect(same.at("boost.out").rms).toBeCloseTo(1, 4);
    close(same.open("switch") * 0.1, "lvl.sw_out", 1e-3);
  });

  test("adds the paths with their sign and correlation, and calls the wrong parity out", () => {
    close(same.at("sum.out").rms, "lvl.sum_same", 1e-3);
    const opposed = plan("inverting");
    close(opposed.at("sum.out").rms, "lvl.sum_opp", 1e-3);
    const weights = [1, 0.1];
    const [a, b] = ["cell", "switch"].map((id, index) => same.open(id) * weights[index]!);
    const [meeting] = meetingsOf(opposed.computed);
    expect(meeting).toMatchObject({ stage: "sum", ports: ["in1", "in2"], commonAncestor: false });
    expect(meeting!.correlation).toBeCloseTo(-worked("sw.rho_8"), 3);
    const both = (rho: number) => Math.hypot(a!, b!) ** 2 + 2 * rho * a! * b!;
    const lost = 10 * Math.log10(both(meeting!.correlation) / both(-meeting!.correlation));
    close(-lost, "lvl.polarity_dB", 2e-3);
    expect(same.at("cell.out").sign).toBe(-1);
    expect(same.at("boost.out").sign).toBe(1);
    expect(same.at("switch.out").sign).toBe(-1);
    expect(opposed.at("switch.out").sign).toBe(1);
  });

  test("ends at rack level with the headroom worked out", () => {
    expect(same.at("driver.out").rms).toBeCloseTo(1.25, 3);
    close(same.at("driver.out").headroomDb!, "lvl.headroom_dB", 2e-3);
    expect(same.at("driver.out").jack).toBe(true);
    expect(same.at("boost.out").jack).toBe(false);
  });
});

describe("over a voice", () => {
  const computed = computeChain(twoPaths(), find);
  const levels = levelsOf(computed);

  test("the first to clip is the one with the least headroom", () => {
    const first = firstToClip(levels)!;
    for (const { headroomDb } of levels)
      if (headroomDb !== undefined) expect(headroomDb).toBeGreaterThanOrEqual(first.headroomDb!);
    expect(firstToClip([])).toBe(undefined);
  });

  test("knobs are turned to both ends, and only those that move a level are listed", () => {
    const ends = levelsAtKnobEnds(computed, find);
    expect(ends.map(({ knob }) => knob.stage).sort()).toEqual(["amount", "envelope", "snap"]);
    const amount = ends.find(({ knob }) => knob.stage === "amount")!;
    const at = (list: typeof levels, node: string) => list.find((level) => level.node === node)!.rms;
    expect(at(amount.low, "band.out")).toBeLessThan(1e-9);
    expect(at(amount.high, "amount.soundOut")).toBeCloseTo(5, 9);
    const range = levelRanges(levels, ends).get("band.out")!;
    expect(range.least).toBeLessThan(1e-9);
    expect(range.most).toBeGreaterThan(at(levels, "band.out"));
    expect(range.worst?.knob.stage).toBe("amount");
    expect(range.worst?.end).toBe("high");
  });

  test("paths that two filters made of one noise are said to go back to it", () => {
    const other = stageOf("other", "band-pass", "multiple-feedback");
    const chain = twoPaths();
    const links = [
      ...chain.links.filter(({ to }) => to.stage !== "sum" || to.port !== "in2"),
      ...linksOf("amount.soundOut > other.in", "other.out > sum.in2").map((link) => ({ ...link, id: `x${link.id}` })),
    ];
    const [meeting] = meetingsOf(computeChain({ ...chain, stages: [...chain.stages, other], links }, find));
    expect(meeting).toMatchObject({ correlation: 0, commonAncestor: true });
  });
});
