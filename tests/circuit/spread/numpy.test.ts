import { describe, expect, it } from "vitest";
import { spreadStage } from "#lib/circuit/analysis/spread/spread.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { binomialBounds } from "#lib/circuit/numeric/binomialBounds.ts";
import { normalQuantile } from "#lib/circuit/numeric/normalQuantile.ts";
import { expectRelative } from "../../support/approx.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";

interface Given {
  boards: number;
  seed: number;
  distribution: "uniform" | "three-sigma";
  tolerances: Record<string, number>;
  lots: string[][];
  temperature: [number, number] | null;
  window: { least: number; most: number };
}
interface Figures {
  passed: number;
  low: number;
  high: number;
  results: Record<string, { mean: number; standardDeviation: number; quantiles: [number, number, number] }>;
  band: [number, number, number, number][];
}
type Bounds = Record<string, { low: number; high: number }>;

const reference = committed<Given, unknown>("spread");
const runs = reference.cases.filter(({ given }) => given.boards !== undefined);
const figuresOf = <T>(id: string) => reference.cases.find(({ given }) => given.id === id)!.figures as T;

const parts = { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 };
const drifts = {
  ra: { least: -5e-5, most: 5e-5 },
  rf: { least: -5e-5, most: 5e-5 },
  rbPot: { least: -1.5e-3, most: -3e-4 },
  c1: { least: -3.125e-4, most: 0 },
};

describe("random boards against numpy on the same samples", () => {
  it.each(runs.map(({ given, figures }) => [given.id, given, figures as Figures] as const))(
    "agree: %s",
    (id, given, figures) => {
      const outcome = spreadStage(multipleFeedback, {
        parts,
        tolerances: given.tolerances,
        distribution: given.distribution,
        boards: given.boards,
        seed: given.seed,
        lots: given.lots,
        window: { centreFrequency: given.window },
        ...(given.temperature && { drifts, temperature: { least: given.temperature[0], most: given.temperature[1] } }),
        band: { curve: "magnitude", at: [700, 952, 1300] },
      });
      expect(outcome.yield!.passed, id).toBe(figures.passed);
      expectRelative(outcome.yield!.low, figures.low, 1e-10, `${id} low`);
      expectRelative(outcome.yield!.high, figures.high, 1e-10, `${id} high`);
      for (const [name, { mean, standardDeviation, quantiles }] of Object.entries(figures.results)) {
        const got = outcome.results[name]!;
        expectRelative(got.mean, mean, 1e-11, `${id} ${name} mean`);
        expectRelative(got.standardDeviation, standardDeviation, 1e-9, `${id} ${name} sd`);
        [got.quantiles["0.05"], got.quantiles["0.5"], got.quantiles["0.95"]].forEach((value, i) =>
          expectRelative(value, quantiles[i]!, 1e-11, `${id} ${name} quantile ${i}`),
        );
      }
      outcome.band!.points.forEach((point, i) =>
        point.forEach((value, j) => expectRelative(value, figures.band[i]![j]!, 1e-9, `${id} band ${i} ${j}`)),
      );
    },
  );

  it("takes the normal deviates that scipy takes", () => {
    for (const [p, deviate] of Object.entries(figuresOf<Record<string, number>>("normal deviates")))
      expectRelative(normalQuantile(Number(p)), deviate, deviate === 0 ? 1e-16 : 4e-15, `deviate of ${p}`);
  });

  it("bounds a share as exactly as scipy's beta distribution", () => {
    for (const [seen, { low, high }] of Object.entries(figuresOf<Bounds>("binomial bounds"))) {
      const [hits, trials] = seen.split(" of ").map(Number);
      const bounds = binomialBounds(hits!, trials!);
      expectRelative(bounds.low, low, 1e-10, `low of ${seen}`);
      expectRelative(bounds.high, high, 1e-10, `high of ${seen}`);
    }
  });

  itGivesTheCommittedFiguresAgain("spread", 1e-12);
});
