import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { accessibilityFaults, launchBrowser, openPage, type WatchedPage } from "../support/browser.ts";
import { hydrated, visit } from "./visit.ts";

let app: RunningApp;
let browser: Browser;
let visitor: WatchedPage;
let page: Page;

beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), launchBrowser()]);
  visitor = await openPage(browser);
  page = visitor.page;
});
afterAll(async () => {
  await visitor?.close();
  await browser?.close();
  await app?.stop();
});

test("a rheostat that misses its window on some boards is re-valued to one that every board covers", async () => {
  await visit(page, `${app.url}/calculators/trim?t=rheostat`);
  await hydrated(page);
  await page.getByRole("button", { name: "Trim", exact: true }).click();
  const panel = page.locator(".trim");
  await panel.getByText("misses it").waitFor();
  await panel.getByLabel("to", { exact: true }).fill("5k");
  await panel.getByText(/must lie below the most/).waitFor();
  await panel.getByLabel("to", { exact: true }).fill("26k");
  await panel.getByRole("button", { name: "Find values" }).click();
  await panel.getByText(/on every board; the first uses/).waitFor();
  await panel
    .getByRole("button", { name: /^Take / })
    .first()
    .click();
  await panel.getByText("covers it").waitFor();
  for (const width of [1440, 390]) {
    await page.setViewportSize({ width, height: 900 });
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth), `${width}`).toBe(0);
    expect(await accessibilityFaults(page)).toEqual([]);
  }
  expect(visitor.consoleErrors.splice(0)).toEqual([]);
});
