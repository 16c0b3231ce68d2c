import { stageKinds } from "#lib/circuit/kinds/index.ts";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { accessibilityFaults, launchBrowser, openPage, type WatchedPage } from "../support/browser.ts";
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

/** What must hold of any page: nothing for axe to find and no scrolling sideways, wide and narrow, light and dark. */
async function faultsOf(page: Page): Promise<string[]> {
  const faults: string[] = [];
  for (const width of [1440, 390]) {
    await page.setViewportSize({ width, height: 900 });
    const note = (found: string[]) => faults.push(...found.map((fault) => `${width} px wide: ${fault}`));
    await page.emulateMedia({ colorScheme: "light" });
    const beyond = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    if (beyond > 0) note([`the page is ${beyond} px wider than the window`]);
    note(await accessibilityFaults(page));
    if (width < 1000) continue;
    // The schemes differ in colour alone, and wide shows all there is to colour.
    await page.emulateMedia({ colorScheme: "dark" });
    note((await accessibilityFaults(page, "color-contrast")).map((fault) => `dark, ${fault}`));
  }
  return faults;
}

const open = [
  "/",
  "/sign-in",
  "/sign-in?next=%2Fteam",
  "/sign-up",
  "/forgot-password",
  "/reset-password?token=abc",
  "/reset-password?error=INVALID_TOKEN",
  "/verify?email=ana@example.org",
  "/verify?confirmed=1",
  "/verify?error=token_expired",
  "/calculators",
  ...stageKinds.map(({ id }) => `/calculators/${id}`),
  "/calculators/band-pass?voice=unknown",
  "/docs/api",
  "/mail",
];

describe("wide and narrow, light and dark", () => {
  let visitor: WatchedPage;
  let member: WatchedPage;

  beforeAll(async () => {
    visitor = await openPage(browser);
    member = await openMemberPage(browser, app.url, "designer");
  });
  afterAll(() => Promise.all([visitor?.close(), member?.close()]));

  test.each(open)("%s is accessible, fits the window and logs no error", async (path) => {
    await visit(visitor.page, app.url + path);
    expect(await faultsOf(visitor.page)).toEqual([]);
    expect(visitor.consoleErrors.splice(0)).toEqual([]);
  });

  test("an unknown address says so, and is accessible", async () => {
    const answer = await visitor.page.goto(`${app.url}/no-such-page`);
    expect(answer?.status()).toBe(404);
    expect(await faultsOf(visitor.page)).toEqual([]);
    // The browser reports the 404 of the page itself; nothing else may be wrong.
    expect(visitor.consoleErrors.splice(0).filter((line) => !line.includes("404"))).toEqual([]);
  });

  test.each(["/voices", "/team", "/team/activity", "/account"])(
    "%s, signed in, is accessible and fits",
    async (path) => {
      await visit(member.page, app.url + path);
      expect(await faultsOf(member.page)).toEqual([]);
      expect(member.consoleErrors.splice(0)).toEqual([]);
    },
  );

  test.each(["Levels", "Supply", "Parts", "Checks"])("the %s of a voice are accessible and fit", async (view) => {
    const { page } = member;
    await visit(page, `${app.url}/voices`);
    await page.getByRole("link", { name: "Shingle" }).click();
    await page.getByRole("navigation", { name: "Views of this voice" }).getByRole("link", { name: view }).click();
    await page.getByRole("heading", { level: 1 }).filter({ hasNotText: "Shingle" }).waitFor();
    await hydrated(page);
    expect(await faultsOf(page)).toEqual([]);
    expect(member.consoleErrors.splice(0)).toEqual([]);
  });

  test("a voice and a stage of it are accessible and fit", async () => {
    const { page } = member;
    await visit(page, `${app.url}/voices`);
    await page.getByRole("link", { name: "Shingle" }).click();
    await page.getByRole("heading", { level: 1, name: "Shingle" }).waitFor();
    await hydrated(page);
    expect(await faultsOf(page)).toEqual([]);
    await page.getByText("Rename or delete this voice").click();
    await page.getByRole("button", { name: "Delete this voice" }).click();
    expect(await faultsOf(page)).toEqual([]);
    await page.locator("main table a").first().click();
    await page.getByRole("heading", { name: "Targets" }).waitFor();
    await hydrated(page);
    expect(await faultsOf(page)).toEqual([]);
    expect(member.consoleErrors.splice(0)).toEqual([]);
  });

  test("the revisions of a voice, one of them and a comparison are accessible and fit", async () => {
    const { page } = member;
    await visit(page, `${app.url}/voices`);
    await page.getByRole("link", { name: "Shingle" }).click();
    await page.getByRole("link", { name: "Revisions" }).click();
    await page.getByRole("heading", { level: 1, name: "Revisions" }).waitFor();
    await hydrated(page);
    expect(await faultsOf(page)).toEqual([]);
    await page.getByRole("link", { name: "Revision 2" }).click();
    await page.getByRole("link", { name: "Compute them again" }).click();
    await page.getByRole("heading", { name: "Computed again" }).waitFor();
    await hydrated(page);
    expect(await faultsOf(page)).toEqual([]);
    await page.getByRole("link", { name: "Compare with the release before" }).click();
    await page.getByRole("heading", { level: 1, name: "Revision 1 compared with revision 2" }).waitFor();
    await hydrated(page);
    expect(await faultsOf(page)).toEqual([]);
    await page.getByRole("link", { name: "Activity" }).click();
    await page.getByRole("heading", { level: 1, name: "Activity" }).waitFor();
    expect(await faultsOf(page)).toEqual([]);
    expect(member.consoleErrors.splice(0)).toEqual([]);
  });

  test("the team as its owner sees it is accessible and fits", async () => {
    const owner = await openMemberPage(browser, app.url, "owner");
    await visit(owner.page, `${app.url}/team`);
    await owner.page.getByRole("button", { name: "Invite" }).waitFor();
    expect(await faultsOf(owner.page)).toEqual([]);
    expect(owner.consoleErrors).toEqual([]);
    await owner.close();
  });
});
