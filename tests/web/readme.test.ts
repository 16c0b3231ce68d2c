import { readFileSync } from "node:fs";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf } from "../support/client.ts";

let app: RunningApp;

beforeAll(async () => {
  app = await startApp();
});

afterAll(() => app.stop());

test("the example of the README gives what the README prints", async () => {
  const readme = readFileSync(new URL("../../README.md", import.meta.url), "utf8");
  const asked = /127\.0\.0\.1:4321(\/api\/kinds\S+) \\\n.*\n\s+-d '(.+)'/.exec(readme);
  const printed = /```json\n([\s\S]+?)```/.exec(readme);
  const { status, body } = await clientOf(app.url).request("POST", asked![1]!, { text: asked![2]! });
  expect(status).toBe(200);
  expect(body).toEqual(JSON.parse(printed![1]!));
});
