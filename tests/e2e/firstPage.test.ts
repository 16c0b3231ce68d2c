import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { accessibilityFaults, launchBrowser, openPage } from "../support/browser.ts";

let app: RunningApp;
let browser: Browser;

beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), launchBrowser()]);
});
afterAll(async () => {
  await browser.close();
  await app.stop();
});

test.each([
  [390, "light"],
  [390, "dark"],
  [1440, "light"],
  [1440, "dark"],
] as const)(
  "the first page fits %i px in %s, and neither axe nor the console has a complaint",
  async (width, colorScheme) => {
    const { page, consoleErrors, close } = await openPage(browser, { viewport: { width, height: 900 }, colorScheme });
    await page.goto(app.url, { waitUntil: "networkidle" });
    await page.getByRole("heading", { level: 1 }).waitFor();
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
    expect(await accessibilityFaults(page)).toEqual([]);
    expect(consoleErrors).toEqual([]);
    await close();
  },
);
