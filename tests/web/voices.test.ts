import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, signIn, type Client, type SignedIn } from "../support/client.ts";
import { emptyDocument } from "../support/stages.ts";

type Who = "owner" | "designer" | "reviewer" | "builder" | "viewer";
const everyone: readonly Who[] = ["owner", "designer", "reviewer", "builder", "viewer"];

let app: RunningApp;
const people = new Map<Who, SignedIn>();
let stranger: Client;

beforeAll(async () => {
  app = await startApp({ RATE_LIMIT_ACCOUNTS: "1000" });
  for (const who of everyone) people.set(who, await signIn(app.url, `${who}@demo.test`));
  stranger = await strangerOf(people.get("viewer")!);
});

afterAll(() => app.stop());

/** The viewer of the demo team, acting in a team of their own, where they are owner. */
async function strangerOf(viewer: SignedIn): Promise<Client> {
  const own = await signIn(app.url, "viewer@demo.test");
  const made = await own.request("POST", "/api/auth/organization/create", {
    json: { name: "Elsewhere", slug: "elsewhere" },
  });
  expect(made.status).toBe(200);
  await own.request("POST", "/api/auth/organization/set-active", { json: { organizationId: made.body.id } });
  expect(viewer.cookie).not.toBe(own.cookie);
  return own;
}

const as = (who: Who) => people.get(who)!;

async function begin(name = "Under test"): Promise<string> {
  const reply = await as("designer").request("POST", "/api/voices", { json: { name } });
  expect(reply.status).toBe(201);
  return reply.body.id;
}

const put = (client: Client, id: string, etag: string | undefined, json: unknown = emptyDocument) =>
  client.request("PUT", `/api/voices/${id}/working-copy`, { json, headers: etag ? { "if-match": etag } : {} });

// What each person gets, in the order owner, designer, reviewer, builder, viewer; then a stranger; then nobody.
const table: { what: string; statuses: string; ask: (client: Client, id: string) => Promise<{ status: number }> }[] = [
  { what: "list the voices", statuses: "200 200 200 200 200 / 200 / 401", ask: (c) => c.request("GET", "/api/voices") },
  {
    what: "begin a voice",
    statuses: "201 201 403 403 403 / 201 / 401",
    ask: (c) => c.request("POST", "/api/voices", { json: { name: "New" } }),
  },
  {
    what: "read a voice",
    statuses: "200 200 200 200 200 / 404 / 401",
    ask: (c, id) => c.request("GET", `/api/voices/${id}`),
  },
  {
    what: "rename a voice",
    statuses: "200 200 403 403 403 / 404 / 401",
    ask: (c, id) => c.request("PATCH", `/api/voices/${id}`, { json: { name: "Renamed" } }),
  },
  {
    what: "read a working copy",
    statuses: "200 200 200 200 403 / 404 / 401",
    ask: (c, id) => c.request("GET", `/api/voices/${id}/working-copy`),
  },
  { what: "save a working copy", statuses: "200 200 403 403 403 / 404 / 401", ask: (c, id) => put(c, id, '"v1"') },
  {
    what: "remove a voice",
    statuses: "204 204 403 403 403 / 404 / 401",
    ask: (c, id) => c.request("DELETE", `/api/voices/${id}`),
  },
];

describe.each(table)("$what", ({ statuses, ask }) => {
  const [team, other, nobody] = statuses.split(" / ");

  test.each(everyone.map((who, index) => ({ who, status: Number(team?.split(" ")[index]) })))(
    "$who: $status",
    async ({ who, status }) => {
      expect((await ask(as(who), await begin())).status).toBe(status);
    },
  );

  test(`an owner of another team: ${other}`, async () => {
    expect((await ask(stranger, await begin())).status).toBe(Number(other));
  });

  test(`without a session: ${nobody}`, async () => {
    expect((await ask(clientOf(app.url), await begin())).status).toBe(Number(nobody));
  });
});

describe("another team's list", () => {
  test("shows none of ours", async () => {
    const id = await begin("Ours alone");
    const reply = await stranger.request("GET", "/api/voices?limit=200");
    expect(reply.body.voices.map((voice: { id: string }) => voice.id)).not.toContain(id);
  });
});

describe("a voice", () => {
  test("has an opaque id, its moments in UTC, and an address", async () => {
    const reply = await as("designer").request("POST", "/api/voices", { json: { name: "  Clap of twigs " } });
    expect(reply.headers.get("location")).toBe(`/api/voices/${reply.body.id}`);
    expect(reply.body).toMatchObject({
      name: "Clap of twigs",
      createdAt: expect.stringMatching(/^\d{4}-\d\d-\d\dT.*Z$/),
      updatedAt: expect.stringMatching(/Z$/),
      createdBy: { name: "Dario Westerby" },
    });
    expect((await as("viewer").request("GET", `/api/voices/${reply.body.id}`)).body).toMatchObject({
      name: "Clap of twigs",
    });
  });

  test("can begin from a template", async () => {
    const json = { name: "From template", template: "two-path-noise" };
    const { body } = await as("designer").request("POST", "/api/voices", { json });
    const copy = await as("designer").request("GET", `/api/voices/${body.id}/working-copy`);
    expect(copy.body.stages.length).toBeGreaterThan(0);
    expect((await put(as("designer"), body.id, copy.headers.get("etag") ?? "", copy.body)).status).toBe(200);
  });

  test.each([
    ["no name", {}, "name"],
    ["an empty name", { name: " " }, "name"],
    ["a name of 121 characters", { name: "x".repeat(121) }, "name"],
    ["a number as name", { name: 5 }, "name"],
    ["a zero byte in its name", { name: "a\u0000b" }, "name"],
    ["an unknown template", { name: "x", template: "kick" }, "template"],
    ["an extra field", { name: "x", teamId: "tea_other" }, "teamId"],
  ])("with %s is refused, and the place is named", async (_, json, path) => {
    const reply = await as("designer").request("POST", "/api/voices", { json });
    expect(reply.status).toBe(422);
    expect(reply.headers.get("content-type")).toBe("application/problem+json");
    expect(reply.body.errors).toEqual([{ path, message: expect.any(String) }]);
  });

  test.each(["x", "%00", "voi_%27", "..%2f..", "voi_".padEnd(4000, "z")])("with the id %s is not found", async (id) => {
    const reply = await as("owner").request("GET", `/api/voices/${id}`);
    expect(reply.status).toBe(404);
    expect(reply.body).toMatchObject({ status: 404 });
  });
});

describe("the list", () => {
  test("is walked by its cursors", async () => {
    for (const name of ["Walk 1", "Walk 2", "Walk 3"]) await begin(name);
    const seen: string[] = [];
    let path = "/api/voices?limit=1&name=Walk&sort=name";
    for (;;) {
      const { status, body } = await as("viewer").request("GET", path);
      expect(status).toBe(200);
      seen.push(...body.voices.map((voice: { name: string }) => voice.name));
      if (body.nextCursor === null) break;
      path = `/api/voices?limit=1&name=Walk&sort=name&cursor=${encodeURIComponent(body.nextCursor)}`;
    }
    expect(seen).toEqual(["Walk 1", "Walk 2", "Walk 3"]);
  });

  test.each(["limit=0", "limit=1e9", "limit=NaN", "sort=size", "cursor=x", "extra=1"])("refuses ?%s", async (query) => {
    const reply = await as("viewer").request("GET", `/api/voices?${query}`);
    expect(reply.status).toBe(422);
    expect(reply.body.errors).toMatchObject([{ path: query.split("=")[0] }]);
  });
});
