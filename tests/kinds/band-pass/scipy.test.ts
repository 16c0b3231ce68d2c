import { execFile } from "node:child_process";
import { existsSync, readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { promisify } from "node:util";
import { describe, expect, it } from "vitest";
import { plotStage } from "#lib/circuit/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";

interface Case {
  given: {
    id: string;
    ra: number;
    rb: number;
    rf: number;
    c1: number;
    c2: number;
    rs: number;
    rl: number | null;
    ft: number | null;
    ro: number;
  };
  figures: Record<"centre" | "peak" | "lower" | "upper" | "noiseBandwidth", number> & {
    curve: [frequency: number, re: number, im: number][];
  };
}
interface Document {
  versions: Record<string, string>;
  cases: Case[];
}

const path = (name: string) => fileURLToPath(new URL(`../../reference/${name}`, import.meta.url));
const committed = JSON.parse(readFileSync(path("band_pass.json"), "utf8")) as Document;

const changeOf = ({ given: { ra, rb, rf, c1, c2, rs, rl, ft, ro } }: Case) => ({
  parts: { ra, rb, rbPot: 0, rf, c1, c2 },
  conditions: { sourceResistance: rs, loadResistance: rl, gainBandwidth: ft, outputResistance: ro },
});

describe(`the multiple-feedback band-pass against scipy ${committed.versions["scipy"]}`, () => {
  const cases = committed.cases.map((one) => [one.given.id, one] as const);

  it.each(cases)("has the peak, −3 dB points and noise bandwidth of %s", (_, one) => {
    const { results } = analyseChange(multipleFeedback, changeOf(one));
    const { centre, peak, lower, upper, noiseBandwidth } = one.figures;
    expectRelative(results["centreFrequency"], centre, 1e-11, "centre");
    expectRelative(results["peakGain"], peak, 1e-12, "peak gain");
    expectRelative(results["lowerEdge"], lower, 1e-11, "lower −3 dB point");
    expectRelative(results["upperEdge"], upper, 1e-11, "upper −3 dB point");
    expectRelative(results["noiseBandwidth"], noiseBandwidth, 1e-9, "noise bandwidth");
  });

  it.each(cases)("has the curve of %s", (_, one) => {
    const { parts, conditions } = changeOf(one);
    const at = one.figures.curve.map(([frequency]) => frequency);
    const lines = plotStage(multipleFeedback, { parts, conditions, curves: ["magnitude", "phase"], at });
    for (const [i, [frequency, re, im]] of one.figures.curve.entries()) {
      const [gain, phase] = ["magnitude", "phase"].map((id) => lines.find((line) => line.id === id)!.points[i]![1]);
      expectRelative(10 ** (gain! / 20), Math.hypot(re, im), 1e-10, `gain at ${frequency} Hz`);
      const turns = (phase! - (Math.atan2(im, re) * 180) / Math.PI) / 360;
      expect(Math.abs(turns - Math.round(turns)) * 360, `phase at ${frequency} Hz`).toBeLessThan(1e-8);
    }
  });
});

/** Debian's own Python, for its scipy package installs there and nowhere else. */
const python = "/usr/bin/python3";
const hasScipy = existsSync(python) && existsSync("/usr/lib/python3/dist-packages/scipy");
if (!hasScipy) console.warn("python3-scipy is not installed: the committed scipy figures are used, not recomputed.");

describe("tests/reference/band_pass.py", () => {
  it.runIf(hasScipy)(
    "gives the committed figures again",
    async () => {
      const { stdout } = await promisify(execFile)(python, ["-W", "ignore", path("band_pass.py")]);
      const again = JSON.parse(stdout) as Document;
      expect(again.cases.map(({ given }) => given)).toEqual(committed.cases.map(({ given }) => given));
      for (const [i, { given, figures }] of again.cases.entries()) {
        const before = committed.cases[i]!.figures;
        for (const key of ["centre", "peak", "lower", "upper", "noiseBandwidth"] as const)
          expectRelative(figures[key], before[key], 1e-9, `${given.id} ${key}`);
        for (const [k, [frequency, re, im]] of figures.curve.entries()) {
          const [, wasRe, wasIm] = before.curve[k]!;
          const size = Math.hypot(wasRe, wasIm);
          expect(Math.hypot(re - wasRe, im - wasIm) / size, `${given.id} at ${frequency} Hz`).toBeLessThan(1e-9);
        }
      }
    },
    60_000,
  );
});
