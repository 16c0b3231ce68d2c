import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { launchBrowser, openPage } from "../support/browser.ts";
import { visit } from "./visit.ts";

let app: RunningApp;
let browser: Browser;

beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), launchBrowser()]);
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

/** What has the focus: its name or role, and whether a sighted person sees that. */
const focused = (page: Page) =>
  page.evaluate(() => {
    const element = document.activeElement as HTMLElement;
    const { outlineStyle, outlineWidth, boxShadow } = getComputedStyle(element);
    const name = element.getAttribute("name") ?? element.getAttribute("aria-label") ?? element.textContent;
    return {
      name: (name ?? "").trim(),
      inSheet: element.closest(".stage") !== null,
      seen: (outlineStyle !== "none" && parseFloat(outlineWidth) >= 1) || boxShadow !== "none",
    };
  });

async function tabTo(page: Page, name: string | RegExp) {
  for (let presses = 0; presses < 80; presses++) {
    await page.keyboard.press("Tab");
    const stop = await focused(page);
    if (typeof name === "string" ? stop.name === name : name.test(stop.name)) return;
  }
  throw new Error(`Tab does not lead to ${name}.`);
}

test("a design by keyboard alone: targets, values along their series, candidates, the curve", async () => {
  const { page, consoleErrors, close } = await openPage(browser);
  await visit(page, `${app.url}/calculators/band-pass?t=multiple-feedback`);

  await tabTo(page, "targets.centreFrequency");
  await page.keyboard.type("1k2");
  await page.keyboard.press("ArrowUp");
  expect(await page.locator(":focus").inputValue()).toBe("1.3k");
  await page.keyboard.press("ArrowDown");
  expect(await page.locator(":focus").inputValue()).toBe("1.2k");

  await tabTo(page, "parts.ra");
  await page.keyboard.type("10k");
  await page.keyboard.press("ArrowUp");
  expect(await page.locator(":focus").inputValue()).toBe("11k");
  await page.keyboard.press("Shift+ArrowUp");
  expect(await page.locator(":focus").inputValue()).toBe("30k");

  await tabTo(page, "Work out parts");
  await page.keyboard.press("Enter");
  await page.getByText("combinations tried").waitFor();
  await tabTo(page, "Take number 2");
  await page.keyboard.press("Enter");
  expect((await focused(page)).name).toBe("Number 2 is in use");
  await page.getByRole("row", { name: /^Centre frequency .* within/ }).waitFor();
  // Once the values have settled, a screen reader is told; the table is silent.
  await page
    .getByRole("status")
    .filter({ hasText: /Centre frequency 1\.\d+.kHz, within/ })
    .waitFor({ state: "attached" });

  await tabTo(page, /^Magnitude: point along the curve/);
  const before = await page.locator(":focus").getAttribute("aria-valuetext");
  await page.keyboard.press("ArrowRight");
  expect(await page.locator(":focus").getAttribute("aria-valuetext")).not.toBe(before);
  expect(consoleErrors).toEqual([]);
  await close();
});

test("Tab goes through the sheet as it is read, and the focus is always seen", async () => {
  const { page, close } = await openPage(browser);
  await visit(page, `${app.url}/calculators/band-pass?t=multiple-feedback`);
  await tabTo(page, "targets.centreFrequency");
  const stops = [await focused(page)];
  while (stops.length < 120) {
    await page.keyboard.press("Tab");
    const stop = await focused(page);
    if (!stop.inSheet) break;
    stops.push(stop);
  }
  expect(stops.filter(({ seen }) => !seen)).toEqual([]);
  const place = (name: string) => stops.findIndex((stop) => stop.name.startsWith(name));
  const order = [
    "targets.centre",
    "windows.centre",
    "targets.peakGain",
    "parts.ra",
    "parts.c2",
    "Work out",
    "Magnitude",
  ];
  const places = order.map(place);
  expect(places).not.toContain(-1);
  expect(places).toEqual([...places].sort((a, b) => a - b));
  await close();
});

test("what is touched on a phone is at least 24 pixels each way", async () => {
  const { page, close } = await openPage(browser, { viewport: { width: 390, height: 844 }, hasTouch: true });
  for (const address of ["/calculators/band-pass?t=multiple-feedback", "/calculators", "/"]) {
    await visit(page, app.url + address);
    const small = await page.evaluate(() => {
      const touched = document.querySelectorAll<HTMLElement>("a, button, input, select, summary, [role='slider']");
      return [...touched].flatMap((element) => {
        // A box is touched through its label, and a link inside a sentence is as high as its line.
        const label = element.matches("input[type='checkbox']") ? element.closest("label") : null;
        const { width, height } = (label ?? element).getBoundingClientRect();
        const inSentence = element.matches("a") && getComputedStyle(element).display === "inline";
        const isSmall = width > 0 && !inSentence && (width < 24 || height < 24);
        return isSmall ? [`${element.tagName} ${element.textContent} ${width}×${height}`] : [];
      });
    });
    expect(small, address).toEqual([]);
  }
  await close();
});
