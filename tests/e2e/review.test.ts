import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { accessibilityFaults, launchBrowser, openPage } from "../support/browser.ts";
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

/** Opens the newest mail of this subject in the demo's mailbox, and follows the first link in it. */
async function followMail(page: Page, subject: string): Promise<void> {
  await visit(page, `${app.url}/mail`);
  await page.getByRole("link", { name: subject }).first().click();
  const link = await page.locator("main .sheet a").first().getAttribute("href");
  await visit(page, link ?? "");
}

async function saveStage(page: Page, path: string, rb: number): Promise<void> {
  const status = await page.evaluate(
    async ({ address, value }) => {
      const read = await fetch(address);
      const copy = (await read.json()) as { stages: { parts: Record<string, number> }[] };
      for (const stage of copy.stages) if ("rb" in stage.parts) stage.parts.rb = value;
      const headers = { "content-type": "application/json", "if-match": read.headers.get("etag") ?? "" };
      return (await fetch(address, { method: "PUT", headers, body: JSON.stringify(copy) })).status;
    },
    { address: `/api${path}/working-copy`, value: rb },
  );
  expect(status).toBe(200);
}

async function makeRevision(page: Page, path: string, reason: string): Promise<void> {
  await visit(page, `${app.url}${path}/revisions`);
  await page.getByLabel("Why this revision, in one line").fill(reason);
  await page.getByRole("button", { name: "Make the revision" }).click();
  await page.getByRole("heading", { level: 1, name: /^Revision \d+$/ }).waitFor();
  await hydrated(page);
  await page.getByRole("button", { name: "Ask for review" }).click();
  await page.getByRole("button", { name: "Ask again" }).waitFor();
}

test("invited, a reviewer returns a revision; the next is compared, released, and read by a guest", async () => {
  const email = "nova@example.test";
  const owner = await openMemberPage(browser, app.url, "owner");
  await visit(owner.page, `${app.url}/team`);
  await owner.page.getByLabel("E-mail").fill(email);
  await owner.page.getByLabel("As", { exact: true }).selectOption("reviewer");
  await owner.page.getByRole("button", { name: "Invite" }).click();
  await owner.page.getByText("Not answered yet").waitFor();

  // The invited person: mail, sign-up, mail, and back to the invitation.
  const reviewer = await openPage(browser);
  await followMail(reviewer.page, "Join Quillfeather Electronics on Clatterbench");
  await reviewer.page.getByRole("link", { name: "Sign up" }).last().click();
  await hydrated(reviewer.page);
  await reviewer.page.getByLabel("Your name").fill("Nova Ashgrove");
  await reviewer.page.getByLabel("E-mail").fill(email);
  await reviewer.page.getByLabel("Password").fill("a long enough word");
  await reviewer.page.getByRole("button", { name: "Sign up" }).click();
  await reviewer.page.getByText("One step is left").waitFor();
  await followMail(reviewer.page, "Confirm your e-mail address for Clatterbench");
  await reviewer.page.getByRole("link", { name: "Go on" }).click();
  await hydrated(reviewer.page);
  await reviewer.page.getByRole("button", { name: "Join Quillfeather Electronics" }).click();
  await reviewer.page.waitForURL(`${app.url}/voices`);

  // The designer: a voice, a revision, a request.
  const designer = await openMemberPage(browser, app.url, "designer");
  await designer.page.getByLabel("Name of the voice").fill("Slate");
  await designer.page.getByLabel("Struck tone").check();
  await designer.page.getByRole("button", { name: "Create the voice" }).click();
  await designer.page.getByRole("heading", { level: 1, name: "Slate" }).waitFor();
  const path = new URL(designer.page.url()).pathname;
  await makeRevision(designer.page, path, "first values");

  // Mail, discussion, return.
  await followMail(reviewer.page, "Review revision 1 of Slate");
  await reviewer.page.getByRole("heading", { level: 1, name: "Revision 1" }).waitFor();
  await hydrated(reviewer.page);
  await reviewer.page.getByLabel("Your remark").fill("@Dario Westerby, is the decay meant to be this long?");
  await reviewer.page.getByRole("button", { name: "Write", exact: true }).click();
  await reviewer.page.getByRole("region", { name: "Thread by Nova Ashgrove" }).waitFor();
  expect(await accessibilityFaults(reviewer.page)).toEqual([]);
  await reviewer.page.getByRole("link", { name: "Review it" }).click();
  await reviewer.page.getByRole("heading", { name: "Before it is released" }).waitFor();
  await hydrated(reviewer.page);
  await reviewer.page.getByRole("button", { name: "Return to the author" }).click();
  await reviewer.page.getByText("Say what has to change before it can be released.").waitFor();
  await reviewer.page.getByLabel("Note with the decision").fill("Shorter, please.");
  await reviewer.page.getByRole("button", { name: "Return to the author" }).click();
  await reviewer.page.getByText("“Shorter, please.”").waitFor();

  await followMail(designer.page, "Nova Ashgrove mentioned you on revision 1 of Slate");
  await designer.page.getByText("is the decay meant to be this long?").waitFor();
  await followMail(designer.page, "Revision 1 of Slate was returned");
  await designer.page.getByText("“Shorter, please.”").waitFor();
  await saveStage(designer.page, path, 620);
  await makeRevision(designer.page, path, "shorter");

  // What changed since nothing was released, then since the first revision.
  await followMail(reviewer.page, "Review revision 2 of Slate");
  await visit(reviewer.page, `${app.url}${path}/compare?from=1&to=2`);
  await reviewer.page.getByRole("heading", { level: 1, name: "Revision 1 compared with revision 2" }).waitFor();
  await reviewer.page.locator(".compare-table").first().waitFor();
  await reviewer.page.getByText("Every changed value has a reason").waitFor();
  await reviewer.page.getByRole("button", { name: "Release revision 2" }).click();
  await reviewer.page.waitForURL(`${app.url}${path}/revisions/2`);
  await reviewer.page.getByText("released", { exact: true }).first().waitFor();

  // The guest, in a browser of their own.
  await visit(owner.page, `${app.url}${path}/revisions/2`);
  await owner.page.getByRole("button", { name: "Make a guest link" }).click();
  const address = await owner.page.getByRole("link", { name: /\/share\// }).getAttribute("href");
  const guest = await openPage(browser);
  await visit(guest.page, address ?? "");
  await guest.page.getByRole("heading", { level: 1, name: "Slate, revision 2" }).waitFor();
  await guest.page.getByText("Nova Ashgrove").waitFor();
  expect(await guest.page.locator('meta[name="robots"]').getAttribute("content")).toBe("noindex");
  expect(await guest.page.content()).not.toContain("Quillfeather");
  expect(await accessibilityFaults(guest.page)).toEqual([]);
  await owner.page.getByRole("button", { name: "Revoke" }).click();
  await owner.page.getByRole("button", { name: "Revoke it" }).click();
  await owner.page.getByRole("button", { name: "Revoke" }).waitFor({ state: "detached" });
  const closed = await guest.page.goto(address ?? "");
  expect(closed?.status()).toBe(404);

  for (const { consoleErrors, close } of [owner, reviewer, designer]) {
    expect(consoleErrors).toEqual([]);
    await close();
  }
  await guest.close();
}, 240_000);

test("two browsers write on one revision at once, and neither loses a word", async () => {
  const [one, two] = [
    await openMemberPage(browser, app.url, "designer"),
    await openMemberPage(browser, app.url, "builder"),
  ];
  await one.page.getByRole("link", { name: "Shingle" }).click();
  await one.page.getByRole("heading", { level: 1, name: "Shingle" }).waitFor();
  const address = `${one.page.url()}/revisions/1`;
  await Promise.all([visit(one.page, address), visit(two.page, address)]);
  const write = async (page: Page, text: string) => {
    await page.getByLabel("Your remark").fill(text);
    await page.getByRole("button", { name: "Write", exact: true }).click();
    await page.getByText(text).waitFor();
  };
  await Promise.all([write(one.page, "From the first browser"), write(two.page, "From the second browser")]);
  await visit(one.page, address);
  await one.page.getByText("From the first browser").waitFor();
  await one.page.getByText("From the second browser").waitFor();
  expect([...one.consoleErrors, ...two.consoleErrors]).toEqual([]);
  await Promise.all([one.close(), two.close()]);
});
