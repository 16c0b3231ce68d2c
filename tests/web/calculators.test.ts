import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf } from "../support/client.ts";

let app: RunningApp;

beforeAll(async () => {
  app = await startApp();
});

afterAll(() => app.stop());

const network = "/api/kinds/band-pass/multiple-feedback";
const parts = { ra: "22k", rb: "2k2", rbPot: "2k", rf: "100k", c1: "10n", c2: "10n" };

const post = (path: string, json: unknown) => clientOf(app.url).request("POST", path, { json });

/** Every number of an answer, at any depth; JSON has no word for NaN, so a null where a figure belongs shows it. */
function holdsNull(value: unknown): boolean {
  if (value === null) return true;
  return typeof value === "object" && Object.values(value).some(holdsNull);
}

describe("the calculators over HTTP", () => {
  test("list the kinds, and describe each one they list", async () => {
    const { body } = await clientOf(app.url).request("GET", "/api/kinds");
    expect(body.kinds.length).toBeGreaterThan(0);
    for (const kind of body.kinds) {
      const described = await clientOf(app.url).request("GET", `/api/kinds/${kind.slug}`);
      expect(described.status).toBe(200);
      expect(described.body.topologies.map((t: { slug: string }) => t.slug)).toEqual(kind.topologies);
    }
  });

  test("analyse parts that are written as people write them", async () => {
    const { status, body } = await post(`${network}/analyse`, { parts, targets: { centreFrequency: "950" } });
    expect(status).toBe(200);
    // Worked set of the trade brief, 2.7: mfb.f0_mid, mfb.Q_mid, mfb.H0.
    expect(body.results.centreFrequency).toBeCloseTo(952.2, 1);
    expect(body.results.qualityFactor).toBeCloseTo(2.991, 3);
    expect(body.results.peakGain).toBeCloseTo(2.2727, 4);
    expect(body.state).toEqual({ centreFrequency: "within" });
    expect(body.warnings).toEqual([]);
  });

  test("give numbers and texts of the same figure the same answer", async () => {
    const written = await post(`${network}/analyse`, { parts });
    const plain = await post(`${network}/analyse`, {
      parts: { ra: 22000, rb: 2200, rbPot: 2000, rf: 100000, c1: 1e-8, c2: 1e-8 },
    });
    expect(plain.body).toEqual(written.body);
  });

  test("warn with figure and limit", async () => {
    const { body } = await post(`${network}/analyse`, { parts, conditions: { sourceResistance: "12k5" } });
    expect(body.warnings).toContainEqual(
      expect.objectContaining({ code: "source-loads-input", severity: "caution", value: 12500 / 22000, limit: 0.02 }),
    );
  });

  test("solve targets in the asked series, best first", async () => {
    const targets = { centreFrequency: "1k", qualityFactor: 3, peakGain: 2 };
    const { status, body } = await post(`${network}/solve`, { targets, series: { resistor: "E96", capacitor: "E6" } });
    expect(status).toBe(200);
    expect(body.exact.results.centreFrequency).toBeCloseTo(1000, 6);
    const merits = body.candidates.map((candidate: { merit: number }) => candidate.merit);
    expect(merits).toEqual([...merits].sort((a, b) => a - b));
    const best = body.candidates[0];
    const again = await post(`${network}/analyse`, { parts: best.parts });
    expect(again.body.results).toEqual(best.results);
    expect(best.errors.centreFrequency).toBeCloseTo(best.results.centreFrequency / 1000 - 1, 12);
  });

  test("say which target to change, and to what, where no resistor satisfies them", async () => {
    const { status, body } = await post(`${network}/solve`, {
      targets: { centreFrequency: "1k", qualityFactor: 1, peakGain: 4 },
    });
    expect(status).toBe(422);
    expect(body.errors).toEqual([{ path: "targets.peakGain", message: expect.stringContaining("below 2.000") }]);
    expect(body.detail).toContain("raise the quality factor above 1.48");
  });

  test("plot the asked points of a curve", async () => {
    const { body } = await post(`${network}/curves`, { parts, at: [100, 1000], curves: ["magnitude"] });
    expect(body.curves.map((curve: { line: string }) => curve.line)).toEqual(["now", "pot-out", "pot-in"]);
    expect(body.curves[0].x).toEqual({ quantity: "Frequency", unit: "Hz" });
    expect(body.curves[0].points.map(([x]: [number]) => x)).toEqual([100, 1000]);
  });

  test("have nothing under a name that is no kind or topology", async () => {
    for (const path of ["/api/kinds/nothing/x/analyse", "/api/kinds/band-pass/nothing/analyse"]) {
      const { status, body } = await post(path, { parts });
      expect(status).toBe(404);
      expect(body.detail).toContain("Known:");
    }
  });
});

describe("bad input to the calculators", () => {
  const with_ = (change: object) => ({ parts: { ...parts, ...change } });

  test.each([
    ["text that is no number", with_({ ra: "abc" }), ["parts.ra"]],
    ["a negative part", with_({ rf: -100 }), ["parts.rf"]],
    ["a part of zero", with_({ c1: 0 }), ["parts.c1"]],
    ["a figure beyond all parts", with_({ ra: 1e300 }), ["parts.ra"]],
    ["text of a figure beyond all parts", with_({ ra: "1e300" }), ["parts.ra"]],
    ["NaN as text", with_({ rb: "NaN" }), ["parts.rb"]],
    ["infinity as text", with_({ rb: "Infinity" }), ["parts.rb"]],
    ["nothing where a figure belongs", with_({ rb: null }), ["parts.rb"]],
    ["a list where a figure belongs", with_({ rb: [1] }), ["parts.rb"]],
    ["a missing part", { parts: { ra: 1e3 } }, ["parts.rb", "parts.rf", "parts.c1", "parts.c2"]],
    ["parts of the wrong type", { parts: "22k" }, ["parts"]],
    ["an extra part", with_({ r9: 1 }), ["parts.r9"]],
    ["an extra field", { parts, more: 1 }, ["more"]],
    ["an unknown choice", { parts, conditions: { potLaw: "bent" } }, ["conditions.potLaw"]],
    ["a rotation past the end", { parts, conditions: { rotation: 1.5 } }, ["conditions.rotation"]],
    ["several faults at once", with_({ ra: "x", rb: "y" }), ["parts.ra", "parts.rb"]],
    ["a list as the body", [], [""]],
  ])("refuses %s and names the place", async (_, json, paths) => {
    const { status, headers, body } = await post(`${network}/analyse`, json);
    expect(status).toBe(422);
    expect(headers.get("content-type")).toBe("application/problem+json");
    expect(body.errors.map((fault: { path: string }) => fault.path)).toEqual(paths);
    expect(body.errors.every((fault: { message: string }) => fault.message.length > 0)).toBe(true);
  });

  test.each([
    ["an empty body", "", 400],
    ["a bare NaN", '{"parts":{"ra":NaN}}', 400],
    ["half a document", '{"parts":', 400],
  ])("refuses %s as no JSON", async (_, text, expected) => {
    const { status, body } = await clientOf(app.url).request("POST", `${network}/analyse`, { text });
    expect(status).toBe(expected);
    expect(body.detail).toContain("Nothing was changed");
  });

  test("refuses a body of 2 MB and one that is no JSON by its type", async () => {
    const big = await clientOf(app.url).request("POST", `${network}/analyse`, { text: `"${"a".repeat(2_000_000)}"` });
    expect(big.status).toBe(413);
    const form = await clientOf(app.url).request("POST", `${network}/analyse`, {
      text: "ra=1",
      headers: { "content-type": "application/x-www-form-urlencoded" },
    });
    expect(form.status).toBe(415);
  });

  test("never answers with an empty figure, at the very ends of what it accepts", async () => {
    const { body: kind } = await clientOf(app.url).request("GET", "/api/kinds/band-pass");
    const schema = kind.topologies[0].parts.properties as Record<string, { minimum: number; maximum: number }>;
    for (const end of ["minimum", "maximum"] as const) {
      for (const only of Object.keys(schema)) {
        const { status, body } = await post(`${network}/analyse`, with_({ [only]: schema[only]![end] }));
        expect(status, `${only} at its ${end}`).toBe(200);
        expect(holdsNull(body), `${only} at its ${end}`).toBe(false);
      }
    }
  });
});
