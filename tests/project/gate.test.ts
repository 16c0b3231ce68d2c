import type { IncomingMessage } from "node:http";
import { describe, expect, test } from "vitest";
import { vouchForHeaders } from "../../src/run/http/forwarded.ts";
import { isForgedWrite } from "../../src/run/http/origin.ts";

const host = "bench.example.org";

describe("a write that carries a cookie", () => {
  test.each([
    ["from our own page", { "sec-fetch-site": "same-origin" }, false],
    ["typed by the person", { "sec-fetch-site": "none" }, false],
    ["from another site", { "sec-fetch-site": "cross-site" }, true],
    ["from a sister host", { "sec-fetch-site": "same-site" }, true],
    ["from an old browser's own page", { origin: `https://${host}` }, false],
    ["from an old browser's other page", { origin: "https://evil.example.org" }, true],
    ["from a page without an origin", { origin: "null" }, true],
    [
      "that says both, and the browser's word counts",
      { "sec-fetch-site": "cross-site", origin: `https://${host}` },
      true,
    ],
    ["from a script, which says neither", {}, false],
  ])("%s", (_, headers, forged) => {
    expect(isForgedWrite({ method: "POST", headers: { host, cookie: "session=1", ...headers } })).toBe(forged);
  });

  test.each(["GET", "HEAD", "OPTIONS"])("is none with %s", (method) => {
    expect(isForgedWrite({ method, headers: { host, cookie: "session=1", "sec-fetch-site": "cross-site" } })).toBe(
      false,
    );
  });

  test("is none without the cookie", () => {
    expect(isForgedWrite({ method: "POST", headers: { host, "sec-fetch-site": "cross-site" } })).toBe(false);
  });
});

describe("the headers an address is built from", () => {
  const request = (headers: Record<string, string>) =>
    ({
      headers: { host: "asked.example.org", ...headers },
      socket: { remoteAddress: "10.0.0.9" },
    }) as unknown as IncomingMessage;

  test("are the connection's own while no proxy is trusted", () => {
    const forged = request({
      "x-forwarded-for": "1.2.3.4",
      "x-forwarded-host": "evil.example.org",
      "x-forwarded-proto": "https",
      "x-forwarded-port": "99",
      "x-real-ip": "1.2.3.4",
      forwarded: "for=1.2.3.4",
    });
    vouchForHeaders(forged, { proxies: 0, origin: undefined });
    expect(forged.headers).toEqual({ host: "asked.example.org", "x-forwarded-for": "10.0.0.9" });
  });

  test.each([
    [1, "6.6.6.6, 1.2.3.4", "1.2.3.4"],
    [2, "6.6.6.6, 1.2.3.4, 10.0.0.2", "1.2.3.4"],
    [2, "1.2.3.4", "10.0.0.9"],
    [1, "", "10.0.0.9"],
  ])("behind %i proxies that say %j begin with %s", (proxies, chain, address) => {
    const proxied = request({ "x-forwarded-for": chain });
    vouchForHeaders(proxied, { proxies, origin: undefined });
    expect(proxied.headers["x-forwarded-for"]).toBe(address);
  });

  test("are the public address where one is set, whatever the request says", () => {
    const asked = request({ "x-forwarded-host": "evil.example.org" });
    vouchForHeaders(asked, { proxies: 1, origin: new URL("https://bench.example.org") });
    expect(asked.headers).toMatchObject({ host: "bench.example.org", "x-forwarded-proto": "https" });
    expect(asked.headers).not.toHaveProperty("x-forwarded-host");
  });
});
