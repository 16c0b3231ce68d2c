import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { launchBrowser, openPage } from "../support/browser.ts";
import { hydrated, openMemberPage, visit } from "./visit.ts";

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

test("what cannot be fetched takes nothing off the sheet, and comes when asked again", async () => {
  const { page, close } = await openPage(browser);
  await visit(page, `${app.url}/calculators/band-pass`);
  await field(page, /^Centre frequency/).fill("1234");
  await page.route("**/_astro/Candidates.*.js", (route) => route.abort());
  await page.getByRole("button", { name: "Work out parts" }).click();
  await page.getByText("This part of the page could not be loaded").waitFor();
  expect(await field(page, /^Centre frequency/).inputValue()).toBe("1.234k");
  await page.unroute("**/_astro/Candidates.*.js");
  await page.getByRole("button", { name: "try again" }).click();
  await page.getByText("combinations tried").waitFor();
  await close();
});

test("nothing typed is lost to a colleague's save, a lost connection or an expired sign-in", async () => {
  const { page, close } = await openMemberPage(browser, app.url, "designer");
  await page.getByRole("link", { name: "Woodpeck" }).click();
  await page.getByRole("link", { name: "Resonator", exact: true }).click();
  await page.getByRole("heading", { name: "Targets" }).waitFor();
  await hydrated(page);
  const address = page.url();
  const copy = `/api${new URL(address).pathname.replace(/\/stages\/.*/, "")}/working-copy`;
  const input = field(page, /^R\d+ strike/);
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
  expect(await input.inputValue()).toBe("20k");
  await close();
});

test("designators and the name are edited, refused at the field, taken back, and saved together", async () => {
  const { page, consoleErrors, close } = await openMemberPage(browser, app.url, "designer");
  await visit(page, `${app.url}/calculators/band-pass`);
  await page.getByRole("button", { name: "Save to a voice" }).click();
  await page.getByLabel("Voice", { exact: true }).selectOption({ label: "Shingle" });
  await page.getByLabel("Name of the stage").fill("Rattle");
  await page.getByRole("button", { name: "Save stage" }).click();
  await page.getByRole("link", { name: "Open it there" }).click();
  await page.getByRole("heading", { level: 1, name: "Rattle" }).waitFor();
  await hydrated(page);

  const mark = field(page, /^Designator of RA/);
  const given = await mark.inputValue();
  const save = page.getByRole("button", { name: "Save stage" });
  await mark.fill("C7");
  await save.click();
  await page.getByText("Write R and a number, such as R12.").waitFor();
  expect(await mark.evaluate((input) => input === document.activeElement)).toBe(true);
  await mark.fill("r1");
  await page.getByText(/R1 is taken in .+\. Choose another number\./).waitFor();
  await field(page, /^Name of the stage/).fill("");
  await page.getByText("Give the stage a name, such as Body or Snap.").waitFor();
  await field(page, /^Quality factor/).fill("4");

  await page.getByRole("button", { name: "Back to the saved values" }).click();
  await page.getByText("As it stands in the working copy").waitFor();
  expect(await mark.inputValue()).toBe(given);
  expect(await field(page, /^Quality factor/).inputValue()).toBe("3");
  expect(await field(page, /^Name of the stage/).inputValue()).toBe("Rattle");
  expect(await save.evaluate((button) => button === document.activeElement)).toBe(true);

  await mark.fill("r81");
  await mark.press("Tab");
  expect(await mark.inputValue()).toBe("R81");
  await field(page, /^Name of the stage/).fill("Sizzle");
  await save.click();
  await page.getByText("Saved in the working copy").waitFor();
  await page.getByRole("heading", { level: 1, name: "Sizzle" }).waitFor();
  await visit(page, page.url());
  expect(await mark.inputValue()).toBe("R81");
  await page.getByRole("heading", { level: 1, name: "Sizzle" }).waitFor();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("a voice asks for a stage, and signing in on the way keeps the voice and the values", async () => {
  const member = await openMemberPage(browser, app.url, "designer");
  await member.page.getByRole("link", { name: "Woodpeck" }).click();
  await member.page.getByText("Size a stage in its calculator").click();
  await member.page.getByRole("link", { name: "Band-pass", exact: true }).click();
  await member.page.waitForURL(/\/calculators\/band-pass\?voice=/);
  const address = member.page.url();
  await member.close();

  const { page, consoleErrors, close } = await openPage(browser);
  await visit(page, address);
  await field(page, /input/).fill("13k7");
  await page.getByRole("link", { name: "Sign in to save to a voice" }).click();
  await hydrated(page);
  await page.getByRole("button", { name: "designer", exact: true }).click();
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(/\/calculators\/band-pass/);
  await hydrated(page);
  expect(await field(page, /input/).inputValue()).toBe("13k7");
  await page.getByRole("button", { name: "Save to a voice" }).click();
  const voice = page.getByLabel("Voice", { exact: true });
  expect(await voice.locator("option:checked").textContent()).toBe("Woodpeck");
  await page.getByLabel("Name of the stage").fill("Knock");
  await page.getByRole("button", { name: "Save stage" }).click();
  await page.getByRole("link", { name: "all stages of Woodpeck" }).click();
  await page.getByRole("row", { name: /Knock/ }).waitFor();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("a reviewer reads the stage and cannot change it", async () => {
  const { page, consoleErrors, close } = await openMemberPage(browser, app.url, "reviewer");
  await page.getByRole("link", { name: "Woodpeck" }).click();
  await page.getByRole("link", { name: "Resonator", exact: true }).click();
  await page.getByText("As reviewer you read this working copy.").waitFor();
  await hydrated(page);
  expect(await page.getByRole("button", { name: "Save stage" }).count()).toBe(0);
  expect(await field(page, /^R\d+ strike/).isEditable()).toBe(false);
  expect(consoleErrors).toEqual([]);
  await close();
});
