import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
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

async function openChain(name: string) {
  const member = await openMemberPage(browser, app.url, "designer");
  const { page } = member;
  const path = await page.evaluate(async (voice) => {
    const answer = await fetch("/api/voices", {
      method: "POST",
      headers: { "content-type": "application/json" },
      body: JSON.stringify({ name: voice, template: "two-path-noise" }),
    });
    const { id } = (await answer.json()) as { id: string };
    return `/voices/${id}`;
  }, name);
  await visit(page, app.url + path);
  await hydrated(page);
  await page.getByRole("button", { name: /^Band ?, / }).waitFor();
  return { ...member, path };
}

test("the chain is drawn, walked by keyboard, and shows what it decides", async () => {
  const { page, consoleErrors, close } = await openChain("Walked");
  expect(await page.locator(".chain-box").count()).toBe(14);
  expect(await page.locator("path.chain-link").count()).toBe(15);
  await page.getByRole("button", { name: /^Noise ?, / }).focus();
  await page.keyboard.press("ArrowRight");
  await page.waitForFunction(() => document.activeElement?.textContent?.includes("Noise amount"));
  await page.keyboard.press("Enter");
  const panel = page.getByRole("region", { name: "Noise amount" });
  await panel.getByText("What the chain decides").waitFor();
  await panel.getByText(/^Load/).waitFor();
  expect(consoleErrors).toEqual([]);
  await close();
});

test("links are taken away and made, steps are taken back, and all of it is saved", async () => {
  const { page, path, consoleErrors, close } = await openChain("Relinked");
  const count = () => page.locator("path.chain-link").count();
  const before = await count();
  await page.getByRole("button", { name: /^Band ?, / }).click();
  const panel = page.getByRole("region", { name: "Band" });
  await panel.getByRole("button", { name: /^Unlink audio in/ }).click();
  await page.getByText("Unlinked. All changes are saved.").waitFor();
  expect(await count()).toBe(before - 1);
  await panel.getByLabel("Link", { exact: true }).selectOption({ label: "audio in from Noise, noise out" });
  await panel.getByRole("button", { name: "Link them" }).click();
  await page.getByText("Linked. All changes are saved.").waitFor();
  await panel.getByRole("button", { name: "Duplicate" }).click();
  await page.getByRole("button", { name: /^Band 2 ?, / }).waitFor();
  await panel.getByRole("button", { name: "Close" }).click();
  await page.getByRole("button", { name: /^Band ?, / }).focus();
  await page.keyboard.press("Control+z");
  await page.keyboard.press("Control+z");
  await page.getByRole("status").filter({ hasText: "All changes are saved." }).waitFor();
  expect(await page.locator(".chain-box").count()).toBe(14);
  expect(await count()).toBe(before - 1);
  await page.getByRole("button", { name: "Redo" }).click();
  await page.getByRole("status").filter({ hasText: "All changes are saved." }).waitFor();
  await visit(page, app.url + path);
  await page.getByRole("button", { name: /^Band ?, / }).waitFor();
  expect(await count()).toBe(before);
  expect(consoleErrors).toEqual([]);
  await close();
});

test("changes made without a connection wait, say so, and are saved once it is back", async () => {
  const { page, path, close } = await openChain("Far away");
  await page.context().setOffline(true);
  await page.getByRole("button", { name: /^Band ?, / }).click();
  await page.getByRole("region", { name: "Band" }).getByRole("button", { name: "Duplicate" }).click();
  await page.getByText("Your changes wait on this page").waitFor();
  await page.getByRole("button", { name: /^Band 2 ?, / }).waitFor();
  await page.context().setOffline(false);
  await page.getByText("All changes are saved.").waitFor();
  await visit(page, app.url + path);
  await page.getByRole("link", { name: "Band 2" }).waitFor();
  await close();
});

test("two people who change one stage choose stage by stage, and nothing else is lost", async () => {
  const { page, path, consoleErrors, close } = await openChain("Shared");
  await page.evaluate(async (voicePath) => {
    const address = `/api${voicePath}/working-copy`;
    const read = await fetch(address);
    const copy = (await read.json()) as { stages: { id: string; name: string }[] };
    const rename = (stage: { id: string; name: string }) =>
      ({ band: { ...stage, name: "Their band" }, sum: { ...stage, name: "Their sum" } })[stage.id] ?? stage;
    await fetch(address, {
      method: "PUT",
      headers: { "content-type": "application/json", "if-match": read.headers.get("etag")! },
      body: JSON.stringify({ ...copy, stages: copy.stages.map(rename) }),
    });
  }, path);
  await page.getByRole("button", { name: /^Band ?, / }).click();
  await page.getByRole("region", { name: "Band" }).getByLabel("Take it out of the chain's influence").check();
  const clash = page.getByRole("group", { name: "Band" });
  await clash.getByLabel("Mine").check();
  await page.getByRole("button", { name: "Bring them together and save" }).click();
  await page.getByText("All changes are saved.").waitFor();
  await visit(page, app.url + path);
  await page.getByRole("link", { name: "Their sum" }).waitFor();
  expect(await page.getByRole("link", { name: "Their band" }).count()).toBe(0);
  expect(consoleErrors.filter((line) => !line.includes("412"))).toEqual([]);
  await close();
});
