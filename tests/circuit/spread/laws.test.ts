import { execFileSync } from "node:child_process";
import { describe, expect, it } from "vitest";
import { runRemedy } from "#lib/circuit/analysis/spread/remedy.ts";
import { runSpread, spreadOutcome, spreadStage } from "#lib/circuit/analysis/spread/spread.ts";
import type { SpreadRequest } from "#lib/circuit/analysis/spread/request.ts";
import { defaultParts, type AnyTopology } from "#lib/circuit/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { binomialBounds } from "#lib/circuit/numeric/binomialBounds.ts";
import { uniformAt } from "#lib/circuit/numeric/counterRandom.ts";
import { shareBeyond } from "#lib/circuit/numeric/gaussianTail.ts";

const parts = { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 };
const tolerances = { ra: 0.01, rb: 0.01, rf: 0.01, rbPot: 0.2, c1: 0.05, c2: 0.05 };
const window = { centreFrequency: { least: 904.6, most: 999.8 } };
const ask = (more: Partial<SpreadRequest> = {}): SpreadRequest => ({
  ...{ parts, tolerances, window, boards: 500, seed: 7, distribution: "uniform" },
  ...more,
});
const every = stageKinds.flatMap((kind) =>
  kind.topologies.map((topology) => [kind.id, topology.id, topology] as const),
);

function toTheEnd<T>(steps: Generator<unknown, T>): T {
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

const usual = (topology: AnyTopology) =>
  Object.fromEntries(Object.entries(topology.parts).map(([part, { tolerance }]) => [part, tolerance]));

describe("the generator of random boards", () => {
  // The known answers that its authors print with it (Random123, kat_vectors, philox2x32 10).
  it.each([
    [0, 0, 0, 0xff1dae59, 0x6cd10df2],
    [0xffffffff, 0xffffffff, 0xffffffff, 0x2c3f628b, 0xab4fd7ad],
    [0x13198a2e, 0x243f6a88, 0x85a308d3, 0xdd7ce038, 0xf62a4c12],
  ])("gives its published answer for key %i", (seed, counter, stream, left, right) => {
    const wanted = ((left >>> 6) * 2 ** 26 + (right >>> 6) + 0.5) / 2 ** 52;
    expect(uniformAt(seed, counter, stream)).toBe(wanted);
  });

  it("gives another process the same figures", () => {
    const script = `
      import { spreadStage } from "#lib/circuit/analysis/spread/spread.ts";
      import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
      console.log(JSON.stringify(spreadStage(multipleFeedback, ${JSON.stringify(ask({ distribution: "three-sigma" }))})));`;
    const printed = execFileSync(process.execPath, ["--import", "tsx", "--input-type=module", "-e", script]);
    const here = spreadStage(multipleFeedback, ask({ distribution: "three-sigma" }));
    expect(JSON.parse(printed.toString())).toEqual(JSON.parse(JSON.stringify(here)));
  });

  it("draws a board alike however many are drawn, and whatever else varies", () => {
    const many = toTheEnd(runSpread(multipleFeedback, ask()));
    const few = toTheEnd(runSpread(multipleFeedback, ask({ boards: 40 })));
    expect([...many.values("centreFrequency").subarray(0, 40)]).toEqual([...few.values("centreFrequency")]);
    const alone = (more: object) =>
      toTheEnd(runSpread(multipleFeedback, ask({ boards: 40, tolerances: { rf: 0.01 }, ...more }))).values("bandwidth");
    // The bandwidth follows R_F and the capacitors alone: varying R_A must not move it.
    expect([...alone({ tolerances: { rf: 0.01, ra: 0.05 } })]).toEqual([...alone({})]);
  });

  it("gives way after every analysis, and what is seen on the way is what the end has", () => {
    const steps = runSpread(multipleFeedback, ask({ boards: 300 }));
    const seen: number[] = [];
    let last: ReturnType<typeof steps.next>;
    do {
      last = steps.next();
      seen.push(last.value.done);
    } while (!last.done);
    expect(Math.max(...seen.slice(1).map((done, i) => done - seen[i]!))).toBe(1);
    expect(spreadOutcome(last.value)).toEqual(spreadStage(multipleFeedback, ask({ boards: 300 })));
  });
});

describe("closed forms", () => {
  it("small normal errors give the deviation and the yield of a normal law", () => {
    const boards = 20_000;
    const small = Object.fromEntries(Object.keys(tolerances).map((part) => [part, 0.003]));
    const { nominal } = spreadStage(multipleFeedback, ask({ boards: 1 }));
    const f0 = nominal["centreFrequency"]!;
    const run = (half: number) =>
      spreadStage(
        multipleFeedback,
        ask({
          boards,
          tolerances: small,
          distribution: "three-sigma",
          window: { centreFrequency: { least: f0 - half, most: f0 + half } },
        }),
      );
    const sigma = run(1).rootSumSquare["centreFrequency"]!.standardDeviation;
    const outcome = run(1.5 * sigma);
    const deviation = outcome.results["centreFrequency"]!.standardDeviation;
    expect(Math.abs(deviation / sigma - 1)).toBeLessThan(4 / Math.sqrt(2 * boards));
    const wanted = 1 - shareBeyond(1.5);
    expect(Math.abs(outcome.yield!.value - wanted)).toBeLessThan(4 * Math.sqrt((wanted * (1 - wanted)) / boards));
  });

  it("one uniform part gives a share that is known exactly", () => {
    // f0 ∝ C1^−½: within the window while C1 lies between (f0/most)² and (f0/least)², its error uniform over ±10 %.
    const boards = 20_000;
    const outcome = spreadStage(multipleFeedback, ask({ boards, tolerances: { c1: 0.1 } }));
    const f0 = outcome.nominal["centreFrequency"]!;
    const [from, to] = [(f0 / 999.8) ** 2, (f0 / 904.6) ** 2].map((share) => Math.min(1.1, Math.max(0.9, share)));
    const wanted = (to! - from!) / 0.2;
    const bounds = binomialBounds(outcome.yield!.passed, boards, 0.9999);
    expect(wanted).toBeGreaterThan(bounds.low);
    expect(wanted).toBeLessThan(bounds.high);
  });

  it("capacitors of one lot spread the centre more, and leave alone what is a ratio", () => {
    const apart = spreadStage(multipleFeedback, ask());
    const lot = spreadStage(multipleFeedback, ask({ lots: [["c1", "c2"]] }));
    const deviation = (outcome: typeof lot, name: string) => outcome.results[name]!.standardDeviation;
    expect(deviation(lot, "centreFrequency")).toBeGreaterThan(1.2 * deviation(apart, "centreFrequency"));
    const exact = spreadStage(multipleFeedback, ask({ tolerances: { ...tolerances, c1: 1e-9, c2: 1e-9 } }));
    expect(deviation(lot, "qualityFactor") / deviation(exact, "qualityFactor")).toBeCloseTo(1, 3);
  });

  it("temperature alone moves the centre by the drift of its parts", () => {
    const drifts = Object.fromEntries(["c1", "c2"].map((part) => [part, { least: -3e-4, most: -3e-4 }]));
    const outcome = spreadStage(
      multipleFeedback,
      ask({ tolerances: {}, drifts, temperature: { least: 273.15, most: 323.15 } }),
    );
    // f0 ∝ 1/C with both alike: at 50 °C C is 0.75 % down.
    const f0 = outcome.nominal["centreFrequency"]!;
    const { least, most } = outcome.worstCase["centreFrequency"]!;
    expect(most / f0).toBeCloseTo(1 / (1 - 3e-4 * 25), 9);
    expect(least / f0).toBeCloseTo(1 / (1 + 3e-4 * 25), 9);
    const relative = outcome.rootSumSquare["centreFrequency"]!.standardDeviation / f0;
    expect(relative).toBeCloseTo((3e-4 * 50) / Math.sqrt(12), 6);
  });
});

/** Distances to the nearest whole number: their extremes lie at no corner. */
const folded = new Set(["ratioRoom"]);

describe("every stage kind", () => {
  it.each(every)("%s, %s: boards stay inside the worst case, and every figure is finite", (_kind, _id, topology) => {
    const parts = defaultParts(topology);
    const run = toTheEnd(
      runSpread(topology, { parts, tolerances: usual(topology), boards: 60, seed: 3, distribution: "uniform" }),
    );
    const outcome = spreadOutcome(run);
    const { method, turning } = run.worstCase!;
    for (const [name, { least, most }] of Object.entries(outcome.worstCase)) {
      expect(Number.isFinite(least) && Number.isFinite(most), name).toBe(true);
      if (method === "corners by sign" || turning.includes(name) || folded.has(name)) continue;
      const slack = 1e-9 * Math.max(Math.abs(least), Math.abs(most));
      for (const value of run.values(name)) {
        if (Number.isNaN(value)) continue;
        expect(value, name).toBeGreaterThanOrEqual(least - slack);
        expect(value, name).toBeLessThanOrEqual(most + slack);
      }
    }
    for (const name of folded) if (name in outcome.results) expect(outcome.turning).toContain(name);
    expect(JSON.stringify(outcome)).not.toContain("null");
  });
});

describe("what it would take", () => {
  const f0 = spreadStage(multipleFeedback, ask({ boards: 1 })).nominal["centreFrequency"]!;
  const within = (share: number) => ({ centreFrequency: { least: f0 * (1 - share), most: f0 * (1 + share) } });
  const remedy = (wanted: number, more: Partial<SpreadRequest> = {}) => {
    const request = ask({
      tolerances: { ...tolerances, c1: 0.1, c2: 0.1 },
      window: within(0.05),
      boards: 1000,
      ...more,
    });
    const run = toTheEnd(runSpread(multipleFeedback, request));
    return { request, answer: toTheEnd(runRemedy(multipleFeedback, request, wanted, run.nominal, run.slopes)) };
  };

  it("changes nothing where the boards are good enough", () => {
    expect(remedy(0.7).answer).toMatchObject({ reached: true, changes: [], cost: 0 });
  });

  it("tightens the capacitors, which weigh most, and reaches what was wanted when those are fitted", () => {
    const { request, answer } = remedy(0.92);
    expect(answer.reached).toBe(true);
    expect(answer.changes.map(({ part, to }) => [part, to])).toEqual([
      ["c1", 0.05],
      ["c2", 0.05],
    ]);
    const changed = Object.fromEntries(answer.changes.map(({ part, to }) => [part, to]));
    const fitted = spreadStage(multipleFeedback, { ...request, tolerances: { ...request.tolerances, ...changed } });
    expect(fitted.yield!.value).toBe(answer.yield.value);
    expect(fitted.yield!.value).toBeGreaterThanOrEqual(0.92);
    // Each alone is cheaper, and not enough.
    for (const part of ["c1", "c2"]) {
      const half = spreadStage(multipleFeedback, { ...request, tolerances: { ...request.tolerances, [part]: 0.05 } });
      expect(half.yield!.value).toBeLessThan(0.92);
    }
  });

  it("says that no tolerance helps where the nominal board lies at the edge", () => {
    const { answer } = remedy(0.99, { window: { centreFrequency: { least: f0, most: f0 * 1.1 } } });
    expect(answer.reached).toBe(false);
    expect(answer.offCentre["centreFrequency"]).toBeCloseTo(-1, 9);
  });
});
