import type { Browser, BrowserContext, Page } from "playwright-core";
import { openPage, type WatchedPage } from "../support/browser.ts";
import { demoPassword } from "../support/client.ts";

/** Opens a page and waits until the islands that load at once answer the hand. */
export async function visit(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await hydrated(page);
}

export async function hydrated(page: Page): Promise<void> {
  await page.waitForFunction(() =>
    [...document.querySelectorAll('astro-island[client="load"]')].every(
      // An island has begun once this is gone. One that waits for more code is alive when React has taken its elements.
      (island) =>
        !island.hasAttribute("ssr") &&
        (island.firstElementChild === null ||
          Object.keys(island.firstElementChild).some((key) => key.startsWith("__react"))),
    ),
  );
}

/** Signs in as one of the demo accounts, the way the sign-in page offers. */
export async function signInAs(page: Page, site: string, role: string): Promise<void> {
  await visit(page, `${site}/sign-in`);
  await page.getByRole("button", { name: role, exact: true }).click();
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL(`${site}/voices`);
  await hydrated(page);
}

type StoredSession = Awaited<ReturnType<BrowserContext["storageState"]>>;

const sessions = new Map<string, Promise<StoredSession>>();

/**
 * A page on which a demo account is signed in already, with the list of voices open. Pages of one role share a session:
 * what ends a session signs in by hand.
 */
export async function openMemberPage(browser: Browser, site: string, role: string): Promise<WatchedPage> {
  const key = `${role} at ${site}`;
  const session = sessions.get(key) ?? beginSession(browser, site, role);
  sessions.set(key, session);
  const opened = await openPage(browser, { storageState: await session });
  await visit(opened.page, `${site}/voices`);
  return opened;
}

async function beginSession(browser: Browser, site: string, role: string): Promise<StoredSession> {
  const context = await browser.newContext();
  const answer = await context.request.post(`${site}/api/auth/sign-in/email`, {
    data: { email: `${role}@demo.test`, password: demoPassword },
  });
  if (!answer.ok()) throw new Error(`${role} could not sign in: ${answer.status()} ${await answer.text()}`);
  const state = await context.storageState();
  await context.close();
  return state;
}
