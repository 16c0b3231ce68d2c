import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { createDatabase } from "../support/database.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, signIn } from "../support/client.ts";

let app: RunningApp;

beforeAll(async () => {
  app = await startApp({ RATE_LIMIT_ACCOUNTS: "1000" });
});

afterAll(() => app.stop());

const ask = (method: string, path: string, headers: Record<string, string> = {}) =>
  clientOf(app.url).request(method, path, { headers });

describe("the service", () => {
  test("says that it works, and which version it is", async () => {
    const { status, body } = await ask("GET", "/api/health");
    expect(status).toBe(200);
    expect(body).toEqual({ status: "ok", version: expect.stringMatching(/^\d+\.\d+\.\d+/), database: "ok" });
  });

  test("describes itself", async () => {
    const { status, body } = await ask("GET", "/api/openapi.json");
    expect(status).toBe(200);
    expect(body.openapi).toBe("3.1.0");
    expect(Object.keys(body.paths)).toEqual(expect.arrayContaining(["/api/voices", "/api/voices/{id}/working-copy"]));
  });

  test.each(["/api", "/api/", "/api/nothing", "/api/voices/x/y/z"])("has nothing at %s", async (path) => {
    const { status, headers, body } = await ask("GET", path);
    expect(status).toBe(404);
    expect(headers.get("content-type")).toBe("application/problem+json");
    expect(body).toMatchObject({ status: 404 });
  });

  test.each([
    ["DELETE", "/api/voices", "GET, POST"],
    ["POST", "/api/voices/x", "GET, PATCH, DELETE"],
    ["POST", "/api/voices/x/working-copy", "GET, PUT"],
    ["PUT", "/api/health", "GET"],
    ["POST", "/api/openapi.json", "GET"],
  ])("does not take %s at %s and says what it takes", async (method, path, allowed) => {
    const { status, headers, body } = await ask(method, path);
    expect(status).toBe(405);
    expect(headers.get("allow")).toBe(`HEAD, ${allowed}`);
    expect(body).toMatchObject({ status: 405 });
  });

  test.each(["/api/health", "/api/voices", "/"])("sends %s with the headers that guard it", async (path) => {
    const { headers } = await ask("GET", path);
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("referrer-policy")).toBe("strict-origin-when-cross-origin");
    expect(headers.get("content-security-policy")).toContain("frame-ancestors 'none'");
  });

  test("lets no script into a page that it did not put there", async () => {
    const policy = (await ask("GET", "/")).headers.get("content-security-policy") ?? "";
    const scripts = /script-src ([^;]+)/.exec(policy)?.[1] ?? "";
    expect(scripts).toContain("'self'");
    expect(scripts).not.toMatch(/unsafe-inline|unsafe-eval|\*/);
  });

  test("refuses a write that another site sends in a signed-in person's name", async () => {
    const owner = await signIn(app.url, "owner@demo.test");
    const json = { name: "Forged" };
    const forged = await owner.request("POST", "/api/voices", { json, headers: { "sec-fetch-site": "cross-site" } });
    expect(forged.status).toBe(403);
  });
});

describe("the limit on calculations", () => {
  test("answers 429 with Retry-After once an address has spent its minute", async () => {
    const limited = await startApp({ RATE_LIMIT_CALCULATORS: "5" });
    try {
      const path = "/api/kinds/band-pass/multiple-feedback/analyse";
      const send = () => clientOf(limited.url).request("POST", path, { json: {} });
      for (let sent = 0; sent < 5; sent += 1) expect((await send()).status).not.toBe(429);
      const reply = await send();
      expect(reply.status).toBe(429);
      expect(Number(reply.headers.get("retry-after"))).toBeGreaterThan(0);
      expect(reply.body).toMatchObject({ status: 429 });
      expect((await clientOf(limited.url).request("GET", "/api/health")).status).toBe(200);
    } finally {
      await limited.stop();
    }
  });
});

describe("a production start", () => {
  const production = {
    CLATTERBENCH_MODE: "production",
    PUBLIC_URL: "https://bench.example.test",
    SMTP_URL: "smtp://127.0.0.1:9",
    MAIL_FROM: "Bench <bench@example.test>",
  };

  test("refuses a database that holds demo accounts, and says why", async () => {
    await expect(startApp(production)).rejects.toThrow(/demo accounts[\s\S]*owner@demo\.test/);
  });

  test("makes no demo account, and its session cookie travels over TLS alone", async () => {
    const database = await createDatabase();
    const server = await startApp({ ...production, DATABASE_URL: database.url });
    try {
      const json = { email: "owner@demo.test", password: "clatter-demo-1" };
      const reply = await clientOf(server.url).request("POST", "/api/auth/sign-in/email", { json });
      expect(reply.status).toBe(401);
      expect((await clientOf(server.url).request("GET", "/")).headers.get("strict-transport-security")).toMatch(
        /max-age/,
      );
    } finally {
      await server.stop();
      await database.drop();
    }
  });
});
