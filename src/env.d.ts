/// <reference types="astro/client" />

declare namespace App {
  interface Locals {
    /** Who asks; null without a valid session, and at the addresses that need none. */
    actor: import("#lib/policy/index.ts").Actor | null;
    /** The origin that links in mails begin with. */
    site: string;
    /** The body, where the server has read it already; the request gives the same bytes, only far more slowly. */
    body?: Uint8Array;
    /** Whether a key speaks for the actor, and no session. */
    byKey: boolean;
    /** Of the browser that asks; null without one. */
    sessionId: string | null;
  }
}
