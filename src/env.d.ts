/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** Who asks; null without a valid session, and at the addresses that need none. */
    actor: import("#lib/policy/index.ts").Actor | null;
    /** The origin that links in mails begin with. */
    site: string;
  }
}
