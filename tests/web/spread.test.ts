import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { spreadStage } from "#lib/circuit/analysis/spread/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf } from "../support/client.ts";

let app: RunningApp;

beforeAll(async () => {
  app = await startApp({ CALCULATION_WORKERS: "1", CALCULATION_QUEUE: "1", CALCULATION_SECONDS: "3" });
});

afterAll(() => app.stop());

const path = "/api/kinds/band-pass/multiple-feedback/spread";
const parts = { ra: 22e3, rb: 2200, rbPot: 2000, rf: 100e3, c1: 10e-9, c2: 10e-9 };
const tolerances = { ra: 0.01, rb: 0.01, rf: 0.01, rbPot: 0.2, c1: 0.05, c2: 0.05 };
const window = { centreFrequency: { least: 904.6, most: 999.8 } };
const body = { parts, tolerances, window, boards: 400, seed: 7 };
/** Longer than the server lets one calculation take. */
const endless = { ...body, boards: 100_000 };
const slow = "/api/kinds/transistor-cell/swing/spread";
const slowBody = async () => {
  const { defaultParts } = await import("#lib/circuit/index.ts");
  const network = stageKinds.flatMap(({ topologies }) => topologies).find(({ id }) => slow.includes(`/${id}/`))!;
  return { parts: defaultParts(network), boards: 100_000 };
};

const post = (json: unknown, to = path) => clientOf(app.url).request("POST", to, { json });

describe("spread over HTTP", () => {
  test("gives the figures that the library gives here, digit for digit", async () => {
    const { status, body: answer } = await post({ ...body, distribution: "three-sigma", lots: [["c1", "c2"]] });
    expect(status).toBe(200);
    const here = spreadStage(multipleFeedback, {
      ...{ parts, tolerances, window, boards: 400, seed: 7, distribution: "three-sigma", lots: [["c1", "c2"]] },
      band: { curve: "magnitude" },
    });
    expect(answer).toEqual(JSON.parse(JSON.stringify(here)));
  });

  test("reads figures as people write them, and takes usual tolerances where none are said", async () => {
    const written = { ra: "22k", rb: "2k2", rbPot: "2k", rf: "100k", c1: "10n", c2: "10n" };
    const usual = await post({ parts: written, window: { centreFrequency: { least: "904.6", most: "999.8" } } });
    const said = await post({ parts, tolerances, window, boards: 1000, seed: 1 });
    expect(usual.status).toBe(200);
    expect(usual.body).toEqual(said.body);
  });

  test("holds a part exact that the tolerances leave out", async () => {
    const { body: answer } = await post({ parts, tolerances: { ra: 0.01 }, boards: 50 });
    expect(answer.results.bandwidth.standardDeviation).toBeLessThan(1e-9);
    expect(answer.results.peakGain.standardDeviation).toBeGreaterThan(1e-3);
    expect(answer).not.toHaveProperty("yield");
  });

  test("takes sorts of part with their drift over a range of temperature", async () => {
    const types = { c1: "polyester", c2: "polyester" };
    const cold = await post({ ...body, tolerances: undefined, types });
    const warm = await post({ ...body, tolerances: undefined, types, temperature: { least: 273.15, most: 323.15 } });
    const deviation = ({ body: { results } }: typeof cold) => results.centreFrequency.standardDeviation as number;
    expect(deviation(warm)).toBeGreaterThan(deviation(cold));
  });

  test("says what it would take", async () => {
    const { body: answer } = await post({ ...body, tolerances: { ...tolerances, c1: 0.1, c2: 0.1 }, wantedYield: 0.9 });
    expect(answer.remedy).toMatchObject({ reached: true, wanted: 0.9 });
    expect(answer.remedy.changes.map(({ part }: { part: string }) => part)).toEqual(["c1", "c2"]);
  });

  test.each([
    ["a window upside down", { window: { centreFrequency: { least: 1000, most: 900 } } }, "window.centreFrequency"],
    ["an empty window", { window: { centreFrequency: {} } }, "window.centreFrequency"],
    ["a window on no result", { window: { centre: { least: 1 } } }, "window.centre"],
    ["a tolerance of zero", { tolerances: { ra: 0 } }, "tolerances.ra"],
    ["a negative tolerance", { tolerances: { ra: -0.01 } }, "tolerances.ra"],
    ["a tolerance of 100 %", { tolerances: { ra: 1 } }, "tolerances.ra"],
    ["a tolerance of no part", { tolerances: { rx: 0.1 } }, "tolerances.rx"],
    ["ten million boards", { boards: 10_000_000 }, "boards"],
    ["no boards", { boards: 0 }, "boards"],
    ["a seed that is no whole number", { seed: 1.5 }, "seed"],
    ["a seed of more than 32 bits", { seed: 2 ** 32 }, "seed"],
    ["an unknown distribution", { distribution: "normal" }, "distribution"],
    ["a lot of one", { lots: [["c1"]] }, "lots.0"],
    [
      "a part in two lots",
      {
        lots: [
          ["c1", "c2"],
          ["c2", "c1"],
        ],
      },
      "lots.1",
    ],
    ["a lot of different sorts", { lots: [["c1", "ra"]] }, "lots.0"],
    ["a resistor made of film that capacitors are made of", { types: { ra: "polyester" } }, "types.ra"],
    ["a temperature below any", { temperature: { least: 10, most: 300 } }, "temperature.least"],
    ["a yield of one", { wantedYield: 1 }, "wantedYield"],
    ["a yield without a window", { wantedYield: 0.9, window: {} }, "window"],
    ["a curve there is not", { curve: "loudness" }, "curve"],
    ["a part left out", { parts: { ra: 1 } }, "parts.rb"],
  ])("refuses %s, at its place", async (_name, wrong, place) => {
    const { status, headers, body: problem } = await post({ ...body, ...wrong });
    expect(status).toBe(422);
    expect(headers.get("content-type")).toContain("application/problem+json");
    expect(problem.errors.map((fault: { path: string }) => fault.path)).toContain(place);
    for (const { message } of problem.errors) expect(message).toMatch(/\.$/);
  });

  test("answers for every stage kind, without a null where a figure belongs", async () => {
    const { defaultParts } = await import("#lib/circuit/index.ts");
    for (const kind of stageKinds)
      for (const topology of kind.topologies) {
        const to = `/api/kinds/${kind.id}/${topology.id}/spread`;
        const { status, body: answer } = await post({ parts: defaultParts(topology), boards: 20 }, to);
        expect(status, to).toBe(200);
        expect(JSON.stringify(answer), to).not.toContain("null");
      }
  });
});

describe("when too much is asked", () => {
  test("a calculation that takes too long is stopped and refused; one beyond the queue is refused at once", async () => {
    const work = await slowBody();
    const first = post(work, slow);
    const second = post(work, slow);
    await new Promise((resolve) => setTimeout(resolve, 300));
    const began = performance.now();
    const third = await post(endless);
    expect(performance.now() - began).toBeLessThan(1000);
    expect(third.status).toBe(503);
    expect(Number(third.headers.get("retry-after"))).toBeGreaterThan(0);
    expect(third.body.type).toBe("urn:clatterbench:problem:busy");
    // Meanwhile the rest of the server answers.
    const health = await clientOf(app.url).request("GET", "/api/health");
    expect(health.status).toBe(200);
    const [one, two] = await Promise.all([first, second]);
    expect([one.status, two.status]).toEqual([503, 503]);
    expect(one.body.detail).toContain("longer than 3 s");
  });

  test("whoever goes away frees the thread", async () => {
    const work = await slowBody();
    const leaving = new AbortController();
    const left = fetch(`${app.url}${slow}`, {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: JSON.stringify(work),
      signal: leaving.signal,
    }).catch(() => undefined);
    await new Promise((resolve) => setTimeout(resolve, 300));
    leaving.abort();
    await left;
    const began = performance.now();
    const { status } = await post(body);
    expect(status).toBe(200);
    // Far less than the three seconds that the abandoned one would have taken.
    expect(performance.now() - began).toBeLessThan(2000);
  });
});
