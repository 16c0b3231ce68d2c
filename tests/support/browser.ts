import { existsSync } from "node:fs";
import axe from "axe-core";
import { chromium, type Browser, type BrowserContextOptions, type Page } from "playwright-core";

const places = [process.env.CHROMIUM, "/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];

export async function launchBrowser(): Promise<Browser> {
  const executablePath = places.find((path) => path && existsSync(path));
  if (!executablePath) throw new Error("Chromium is missing: apt-get install chromium, or name it in CHROMIUM.");
  return chromium.launch({
    executablePath,
    // Chromium's sandbox needs rights that containers and root do not give; the pages are our own.
    args: ["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking"],
  });
}

export interface WatchedPage {
  page: Page;
  /** Errors the browser's console has shown so far, failed loads included. A journey ends by expecting none. */
  consoleErrors: string[];
  close(): Promise<void>;
}

/** A page of its own session, whose console is watched. */
export async function openPage(browser: Browser, options: BrowserContextOptions = {}): Promise<WatchedPage> {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 }, ...options });
  const page = await context.newPage();
  const consoleErrors: string[] = [];
  page.on("console", (message) => {
    if (message.type() === "error") consoleErrors.push(`${message.text()} (${page.url()})`);
  });
  page.on("pageerror", (error) => consoleErrors.push(`${error.message} (${page.url()})`));
  return { page, consoleErrors, close: () => context.close() };
}

const everyRule = {
  type: "tag",
  values: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"],
} as const;

/** What axe finds wrong with the page as it is now, by these rules alone if any are named: one line for each rule and place. */
export async function accessibilityFaults(page: Page, ...rules: string[]): Promise<string[]> {
  // Evaluated rather than added as a script element, which the pages' content security policy would refuse.
  if (!(await page.evaluate(() => "axe" in globalThis))) await page.evaluate(axe.source);
  const runOnly: axe.RunOnly =
    rules.length > 0 ? { type: "rule", values: rules } : { ...everyRule, values: [...everyRule.values] };
  const { violations } = await page.evaluate(async (only) => {
    const { axe: injected } = globalThis as unknown as { axe: typeof axe };
    return injected.run(document, { runOnly: only, resultTypes: ["violations"] });
  }, runOnly);
  return violations.flatMap(({ id, help, nodes }) =>
    nodes.map(({ target }) => `${id}: ${help} at ${target.join(" ")}`),
  );
}
