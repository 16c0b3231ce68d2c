import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { launchBrowser, openPage } from "../support/browser.ts";
import { hydrated, openMemberPage, signInAs, visit } from "./visit.ts";

let app: RunningApp;
let browser: Browser;

beforeAll(async () => {
  [app, browser] = await Promise.all([startApp(), launchBrowser()]);
});
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

test("a newcomer signs up, confirms the address from the demo mailbox and has a team", async () => {
  const { page, consoleErrors, close } = await openPage(browser);
  await visit(page, `${app.url}/sign-up`);
  await page.getByLabel("Your name").fill("Ines Harrowgate");
  await page.getByLabel("E-mail").fill("ines@bench.test");
  await page.getByLabel("Password").fill("short");
  await page.getByRole("button", { name: "Sign up" }).click();
  await page.getByText("Use at least 8 characters.").waitFor();
  expect(await page.getByLabel("Your name").inputValue()).toBe("Ines Harrowgate");

  await page.getByLabel("Password").fill("a longer phrase");
  await page.getByRole("button", { name: "Sign up" }).click();
  await page.waitForURL(/\/verify\?/);
  await page.getByRole("link", { name: "Read it in the demo mailbox" }).click();
  await page
    .getByRole("row", { name: /ines@bench\.test/ })
    .getByRole("link")
    .click();
  await page
    .locator("main")
    .getByRole("link", { name: /verify-email/ })
    .click();
  await page.getByText("Confirmed.").waitFor();
  await page.getByRole("link", { name: "Go on" }).click();
  await page.getByRole("heading", { name: "No voice yet" }).waitFor();

  await page.getByRole("link", { name: "Team" }).click();
  await page.getByRole("row", { name: /Ines Harrowgate.*owner/ }).waitFor();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("the keyboard alone signs in, and a private page asked for before comes back", async () => {
  const { page, consoleErrors, close } = await openPage(browser);
  await page.goto(`${app.url}/team`);
  await page.waitForURL(/\/sign-in\?next=/);
  await hydrated(page);

  await page.keyboard.press("Tab");
  expect(await page.evaluate(() => document.activeElement?.textContent)).toBe("Skip to content");
  await page.keyboard.press("Enter");
  await page.keyboard.press("Tab");
  await page.keyboard.type("designer@demo.test");
  await page.keyboard.press("Tab");
  await page.keyboard.type("clatter-demo-1");
  await page.keyboard.press("Enter");
  await page.waitForURL(`${app.url}/team`);
  await page.getByRole("heading", { level: 1, name: "Quillfeather Electronics" }).waitFor();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("a wrong password says so, keeps the address and takes the focus to the message", async () => {
  const { page, close } = await openPage(browser);
  await visit(page, `${app.url}/sign-in`);
  await page.getByLabel("E-mail").fill("owner@demo.test");
  await page.getByLabel("Password").fill("not this one");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  const message = page.getByRole("alert");
  await message.getByText("No account has this e-mail address and password.").waitFor();
  expect(await message.evaluate((box) => box === document.activeElement)).toBe(true);
  expect(await page.getByLabel("E-mail").inputValue()).toBe("owner@demo.test");
  await close();
});

test("a forgotten password is replaced by the mailed link, which works once", async () => {
  const { page, consoleErrors, close } = await openPage(browser);
  await visit(page, `${app.url}/sign-in`);
  await page.getByRole("link", { name: "Set a new password" }).click();
  await hydrated(page);
  await page.getByLabel("E-mail").fill("builder@demo.test");
  await page.getByRole("button", { name: "Send a link" }).click();
  await page.getByText("If builder@demo.test belongs to an account").waitFor();

  await page.goto(`${app.url}/mail`);
  await page
    .getByRole("row", { name: /builder@demo\.test/ })
    .getByRole("link")
    .click();
  const link = page.locator("main").getByRole("link", { name: /reset-password/ });
  const address = await link.getAttribute("href");
  await link.click();
  await page.waitForURL(/\/reset-password\?token=/);
  await hydrated(page);
  await page.getByLabel("New password").fill("short");
  await page.getByRole("button", { name: "Set the password" }).click();
  await page.getByText("Use at least 8 characters.").waitFor();
  await page.getByLabel("New password").fill("a quieter phrase");
  await page.getByRole("button", { name: "Set the password" }).click();
  await page.getByText("The new password is set. Sign in with it.").waitFor();
  await hydrated(page);
  expect(consoleErrors.splice(0)).toEqual([]);

  await page.getByLabel("E-mail").fill("builder@demo.test");
  await page.getByLabel("Password").fill("clatter-demo-1");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.getByText("No account has this e-mail address and password.").waitFor();
  await page.getByLabel("Password").fill("a quieter phrase");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(`${app.url}/voices`);

  await page.goto(address ?? "");
  await page.waitForURL(/\/reset-password\?error=INVALID_TOKEN/);
  await close();
});

test("the account menu closes on Escape and by a press elsewhere", async () => {
  const { page, consoleErrors, close } = await openMemberPage(browser, app.url, "reviewer");
  const menu = page.locator("details.menu");
  await menu.locator("summary").press("Enter");
  await page.getByRole("link", { name: "Your account" }).focus();
  await page.keyboard.press("Escape");
  expect(await menu.getAttribute("open")).toBeNull();
  expect(await menu.locator("summary").evaluate((summary) => summary === document.activeElement)).toBe(true);
  await menu.locator("summary").click();
  await page.getByRole("heading", { level: 1 }).click();
  expect(await menu.getAttribute("open")).toBeNull();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("signing out ends the session", async () => {
  const { page, consoleErrors, close } = await openPage(browser, { viewport: { width: 390, height: 844 } });
  await signInAs(page, app.url, "viewer");
  await page.getByText("Account", { exact: true }).click();
  await page.getByRole("button", { name: "Sign out" }).click();
  await page.waitForURL(`${app.url}/`);
  await page.goto(`${app.url}/voices`);
  await page.waitForURL(/\/sign-in\?next=%2Fvoices/);
  expect(consoleErrors).toEqual([]);
  await close();
});

test("a chosen theme is remembered and holds before anything is drawn", async () => {
  const { page, close } = await openPage(browser, { colorScheme: "light" });
  await visit(page, `${app.url}/sign-in`);
  const paper = () => page.evaluate(() => getComputedStyle(document.documentElement).backgroundColor);
  const light = await paper();
  await page.getByLabel("Theme").selectOption("dark");
  const dark = await paper();
  expect(dark).not.toBe(light);
  await page.goto(`${app.url}/sign-up`, { waitUntil: "commit" });
  await page.waitForFunction(() => document.body !== null);
  expect(await page.evaluate(() => document.documentElement.dataset.theme)).toBe("dark");
  await page.waitForLoadState();
  expect(await paper()).toBe(dark);
  await page.getByLabel("Theme").selectOption("system");
  expect(await paper()).toBe(light);
  await close();
});

test("without JavaScript the pages read, and navigation and sign-out need none", async () => {
  const { page, close } = await openPage(browser, { javaScriptEnabled: false, viewport: { width: 390, height: 844 } });
  await page.goto(`${app.url}/`);
  await page.getByRole("navigation", { name: "Main" }).getByRole("link", { name: "Calculators" }).click();
  await page.waitForURL(`${app.url}/calculators`);
  await page.goto(`${app.url}/sign-in`);
  expect(await page.locator("noscript").textContent()).toContain("Signing in needs JavaScript.");
  await page.getByLabel("E-mail").waitFor();
  expect(await page.getByLabel("Theme").isVisible()).toBe(false);
  await close();
});
