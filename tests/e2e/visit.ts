import type { Page } from "playwright-core";

/** Opens a page and waits until the islands that load at once answer the hand. */
export async function visit(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await hydrated(page);
}

export async function hydrated(page: Page): Promise<void> {
  await page.waitForFunction(() => document.querySelector('astro-island[client="load"][ssr]') === null);
}

/** Signs in as one of the demo accounts, the way the sign-in page offers. */
export async function signInAs(page: Page, site: string, role: string): Promise<void> {
  await visit(page, `${site}/sign-in`);
  await page.getByRole("button", { name: role, exact: true }).click();
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(`${site}/voices`);
  await hydrated(page);
}
