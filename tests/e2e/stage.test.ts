import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { launchBrowser, openPage } from "../support/browser.ts";
import { hydrated, signInAs, visit } from "./visit.ts";

let app: RunningApp;
let browser: Browser;

beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), launchBrowser()]);
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const field = (page: Page, name: RegExp) => page.getByRole("textbox", { name });
const result = (page: Page, name: RegExp) =>
  page.getByRole("table", { name: "Results" }).getByRole("row", { name }).first();

test("from targets without an account to a stage saved in a voice, and found again", async () => {
  const { page, consoleErrors, close } = await openPage(browser);
  await visit(page, `${app.url}/calculators/band-pass`);
  await field(page, /^Centre frequency/).fill("1k");
  await field(page, /^Quality factor/).fill("3");
  await field(page, /^Peak gain/).fill("2");
  await page.getByRole("button", { name: "Work out parts" }).click();
  await page.getByText("In use").waitFor();
  await page.getByRole("button", { name: "Take number 2" }).click();
  await result(page, /^Centre frequency .* within/).waitFor();

  const input = field(page, /input/);
  await input.fill("13k7");
  await input.press("ArrowUp");
  await input.press("Tab");
  const stepped = await input.inputValue();
  expect(stepped).toBe("15k");

  // The values travel through sign-in in the page's address.
  await page.getByRole("link", { name: "Sign in to save to a voice" }).click();
  await hydrated(page);
  await page.getByRole("button", { name: "designer", exact: true }).click();
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(/\/calculators\/band-pass/);
  await hydrated(page);
  expect(await field(page, /input/).inputValue()).toBe(stepped);

  await page.getByRole("button", { name: "Save to a voice" }).click();
  await page.getByLabel("Voice", { exact: true }).selectOption({ label: "Shingle" });
  await page.getByLabel("Name of the stage").fill("Snap");
  await page.getByRole("button", { name: "Save stage" }).click();
  await page.getByRole("link", { name: "Open it there" }).click();
  await page.getByRole("heading", { level: 1, name: "Snap" }).waitFor();
  await hydrated(page);
  expect(await field(page, /^R\d+ input/).inputValue()).toBe(stepped);

  await visit(page, `${app.url}/voices`);
  await page.getByRole("link", { name: "Shingle" }).click();
  await page.getByRole("row", { name: /Snap/ }).waitFor();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("nothing typed is lost to a colleague's save, a lost connection or an expired sign-in", async () => {
  const { page, close } = await openPage(browser);
  await signInAs(page, app.url, "designer");
  await page.getByRole("link", { name: "Woodpeck" }).click();
  await page.locator("main table a").first().click();
  await page.getByRole("heading", { name: "Targets" }).waitFor();
  await hydrated(page);
  const address = page.url();
  const copy = `/api${new URL(address).pathname.replace(/\/stages\/.*/, "")}/working-copy`;
  const input = field(page, /input/);
  const save = page.getByRole("button", { name: "Save stage" });

  await input.fill("18k");
  await page.getByText("Changes not saved yet").waitFor();
  await page.evaluate(async (path) => {
    const read = await fetch(path);
    await fetch(path, {
      method: "PUT",
      headers: { "content-type": "application/json", "if-match": read.headers.get("etag") ?? "" },
      body: await read.text(),
    });
  }, copy);
  await save.click();
  await page.getByText("Someone saved a newer copy of this voice.").waitFor();
  expect(await input.inputValue()).toBe("18k");
  await page.getByRole("button", { name: "Put this stage into the newer copy" }).click();
  await page.getByText("Saved in the working copy").waitFor();

  await page.context().setOffline(true);
  await input.fill("20k");
  await save.click();
  await page.getByText("The server could not be reached.").waitFor();
  expect(await input.inputValue()).toBe("20k");
  await page.context().setOffline(false);

  const cookies = await page.context().cookies();
  await page.context().clearCookies();
  await save.click();
  await page.getByText("Your sign-in has expired.").waitFor();
  expect(await input.inputValue()).toBe("20k");

  await page.context().addCookies(cookies);
  await save.click();
  await page.getByText("Saved in the working copy").waitFor();
  await visit(page, address);
  expect(await field(page, /input/).inputValue()).toBe("20k");
  await close();
});

test("a reviewer reads the stage and cannot change it", async () => {
  const { page, consoleErrors, close } = await openPage(browser);
  await signInAs(page, app.url, "reviewer");
  await page.getByRole("link", { name: "Woodpeck" }).click();
  await page.locator("main table a").first().click();
  await page.getByText("As reviewer you read this working copy.").waitFor();
  await hydrated(page);
  expect(await page.getByRole("button", { name: "Save stage" }).count()).toBe(0);
  expect(await field(page, /input/).isEditable()).toBe(false);
  expect(consoleErrors).toEqual([]);
  await close();
});
