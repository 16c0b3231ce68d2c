import { settings } from "./env.ts";

/** The origin that links in mails begin with: a demo is opened under whichever loopback name and port happens to be used. */
export function siteOf(url: URL): string {
  const { CLATTERBENCH_MODE, PUBLIC_URL } = settings();
  return CLATTERBENCH_MODE === "demo" ? url.origin : PUBLIC_URL;
}
