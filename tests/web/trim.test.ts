import { afterAll, beforeAll, describe, expect, test } from "vitest";
import worked from "../reference/worked.json" with { type: "json" };
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf } from "../support/client.ts";

let app: RunningApp;

beforeAll(async () => {
  app = await startApp();
});

afterAll(() => app.stop());

const path = "/api/kinds/trim/rheostat/trim";
const body = {
  parts: { rFixed: "4k7", rPot: "100k" },
  conditions: { controlVoltage: 7.8 },
  result: "current",
  window: { least: "300u", most: "700u" },
  boards: 300,
};
const post = (json: unknown, to = path) => clientOf(app.url).request("POST", to, { json });

describe("trims over HTTP", () => {
  test("the original trim of the trade brief, 2.15, and values at least as good as those shown there", async () => {
    const { status, body: answer } = await post({ ...body, revalue: { useful: 0.5 } });
    expect(status).toBe(200);
    expect(answer.usefulDegrees).toBeCloseTo(worked["trim.orig_use_deg"].value, 4);
    expect(answer.revalue.reached).toBe(true);
    expect(answer.revalue.choices[0].usefulRotation).toBeGreaterThanOrEqual(worked["trim.new_use_pct"].value / 100);
    expect(answer.coverage.ofWindow.value).toBe(1);
    const again = await post({ ...body, parts: { rFixed: 4700, rPot: 1e5, ...answer.revalue.choices[0].parts } });
    expect(again.body.worstCaseMargin).toBeGreaterThanOrEqual(0);
  });

  test("knows laws that the stage itself does not ask for", async () => {
    const filter = "/api/kinds/band-pass/multiple-feedback/trim";
    const parts = { ra: "22k", rb: "2k2", rbPot: "2k", rf: "100k", c1: "10n", c2: "10n" };
    const ask = (knob: object) =>
      post({ parts, result: "centreFrequency", window: { least: 900, most: 1000 }, boards: 20, knob }, filter);
    const [linear, segments] = await Promise.all([ask({}), ask({ law: "logarithmic", shape: "two-segment" })]);
    expect(linear.status).toBe(200);
    expect(segments.body.ends).toEqual(linear.body.ends);
    expect(segments.body.usefulRotation).not.toBeCloseTo(linear.body.usefulRotation, 2);
  });

  test.each([
    ["a window upside down", { window: { least: "700u", most: "300u" } }, "window"],
    ["a window with one side", { window: { least: 1e-3 } }, "window.most"],
    ["a figure that is none", { window: { least: "soon", most: 1 } }, "window.least"],
    ["a result there is not", { result: "loudness" }, "result"],
    ["a law there is not", { knob: { law: "cubic" } }, "knob.law"],
    ["all of the travel", { revalue: { useful: 1 } }, "revalue.useful"],
    ["a tolerance of zero", { tolerances: { rPot: 0 } }, "tolerances.rPot"],
    ["ten million boards", { boards: 1e7 }, "boards"],
  ])("refuses %s, at its place", async (_name, wrong, place) => {
    const { status, body: problem } = await post({ ...body, ...wrong });
    expect(status).toBe(422);
    expect(problem.errors.map((fault: { path: string }) => fault.path)).toContain(place);
  });

  test("refuses a stage without a pot, or with none fitted, in words", async () => {
    const filter = "/api/kinds/band-pass/multiple-feedback/trim";
    const parts = { ra: "22k", rb: "2k2", rf: "100k", c1: "10n", c2: "10n" };
    const asked = { parts, result: "centreFrequency", window: { least: 900, most: 1000 } };
    const { status, body: problem } = await post(asked, filter);
    expect(status).toBe(422);
    expect(problem.errors).toEqual([{ path: "parts", message: "No pot is fitted. Give rbPot a value above zero." }]);
  });

  test("says why a pot can never reach", async () => {
    const { status, body: answer } = await post({
      ...body,
      window: { least: "300u", most: "2m" },
      revalue: { useful: 0.9 },
    });
    expect(status).toBe(200);
    expect(answer.worstCaseMargin).toBeLessThan(0);
    expect(answer.revalue.reached).toBe(false);
    expect(answer.revalue.says).toMatch(/every board/);
  });
});
