import { computeChain, levelsOf, meetingsOf, supplyOf, type Chain, type ChainStage } from "#lib/circuit/voice/index.ts";
import { describe, expect, test } from "vitest";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";
import { find, linksOf, stageOf } from "../../support/chains.ts";

interface Path {
  kind: "inverting" | "non-inverting" | "cell";
  ri: number;
  rf: number;
  rb: number;
  ro: number;
  rin: number;
  rsh: number;
  bias: number;
}
interface Given {
  id: string;
  first: number;
  second: number;
  pot: { top: number; track: number; bottom: number; rotation: number };
  paths: Path[];
  sum: { r: number[]; rf: number };
  driver: { ri: number; rf: number; ro: number; load: number };
}
interface Figures {
  wiper: number;
  paths: number[];
  correlation: number;
  sum: number;
  jack: number;
  headroomDb: number;
  supply: { positive: number; negative: number; most: number; limit: number; power: number };
}

function stageOfPath(path: Path, id: string): ChainStage {
  if (path.kind === "cell") {
    const { rin, rsh, rf, bias } = path;
    return stageOf(id, "ota-cell", "transimpedance", { parts: { rin, rsh, rf }, conditions: { biasCurrent: bias } });
  }
  const { ri, rf, rb, ro } = path;
  const inverting = path.kind === "inverting";
  return stageOf(id, "output-driver", path.kind, { parts: { ri, rf, ro, ...(!inverting && { rb }) } });
}

function voiceOf(given: Given): Chain {
  const { pot, paths, sum, driver } = given;
  const last = paths.length - 1;
  const resistors = Object.fromEntries([1, 2, 3, 4, 5, 6, 7, 8].map((k) => [`r${k}`, sum.r[k - 1] ?? 0]));
  return {
    stages: [
      stageOf("first", "test-noise", "white", { conditions: { rms: given.first } }),
      stageOf("second", "test-noise", "white", { conditions: { rms: given.second } }),
      stageOf("pot", "trim", "divider", {
        parts: { rTop: pot.top, rPot: pot.track, rBottom: pot.bottom },
        conditions: { rotation: pot.rotation },
      }),
      ...paths.map((path, index) => stageOfPath(path, `path${index}`)),
      stageOf("sum", "summing-node", "inverting", { parts: { ...resistors, rf: sum.rf } }),
      stageOf("driver", "output-driver", "inverting", {
        parts: { ri: driver.ri, rf: driver.rf, ro: driver.ro },
        conditions: { loadResistance: driver.load },
      }),
    ],
    links: linksOf(
      "first.out > pot.soundIn",
      ...paths.map((_, index) => `${index === last ? "second.out" : "pot.soundOut"} > path${index}.in`),
      ...paths.map((_, index) => `path${index}.out > sum.in${index + 1}`),
      "sum.out > driver.in",
    ),
    conditions: {},
  };
}

const near = (value: number, wanted: number, what: string, tolerance = 1e-6) =>
  expect(Math.abs(value / wanted - 1), `${what}: ${value} against ${wanted}`).toBeLessThan(tolerance);

const { cases } = committed<Given, Figures>("whole_voice");

describe("random voices, against numpy", () => {
  test.each(cases)("$given.id: levels", ({ given, figures }) => {
    const computed = computeChain(voiceOf(given), find);
    const rms = new Map(levelsOf(computed).map((level) => [level.node, level]));
    near(rms.get("pot.soundOut")!.rms, figures.wiper, "wiper");
    figures.paths.forEach((wanted, index) => {
      // Behind an output resistor the path's own figure is the one without the sum's load.
      const signal = computed.stages.get(`path${index}`)!.gives.out;
      near(signal?.sort === "audio" ? signal.rms : 0, wanted, `path ${index}`);
    });
    near(rms.get("sum.out")!.rms, figures.sum, "sum");
    near(rms.get("driver.out")!.rms, figures.jack, "jack");
    near(rms.get("driver.out")!.headroomDb!, figures.headroomDb, "headroom", 1e-5);
    const meeting = meetingsOf(computed).find(({ ports }) => ports[0] === "in1" && ports[1] === "in2")!;
    near(meeting.correlation, figures.correlation, "correlation");
  });

  test.each(cases)("$given.id: supply", ({ given, figures: { supply } }) => {
    const budget = supplyOf(computeChain(voiceOf(given), find));
    near(budget.positive.typical, supply.positive, "positive", 1e-9);
    near(budget.negative.typical, supply.negative, "negative", 1e-9);
    near(budget.positive.most, supply.most, "most", 1e-9);
    near(budget.limit, supply.limit, "limit", 1e-9);
    near(budget.power, supply.power, "power", 1e-9);
  });

  itGivesTheCommittedFiguresAgain("whole_voice", 1e-9);
});
