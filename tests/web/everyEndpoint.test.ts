import { routes, type Route } from "#lib/wire/routes/index.ts";
import postgres from "postgres";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, signIn, type Client, type SignedIn } from "../support/client.ts";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

const team = ["owner", "designer", "reviewer", "builder", "viewer"] as const;
type Who = (typeof team)[number];

/**
 * Which roles each operation lets pass, and whether it concerns things of one team: those do not exist for another. `self`
 * is about nobody but whoever asks. A route that is in no row fails.
 */
const drawing = ["owner", "designer"] as const;
const workshop = ["owner", "designer", "reviewer", "builder"] as const;
const rows: Record<string, { may: readonly Who[]; of: "team" | "thing" | "self"; body?: unknown; changes?: true }> = {
  listVoices: { may: team, of: "team" },
  createVoice: { may: drawing, of: "team", body: { name: "New" }, changes: true },
  readVoice: { may: team, of: "thing" },
  renameVoice: { may: drawing, of: "thing", body: { name: "Renamed" }, changes: true },
  removeVoice: { may: drawing, of: "thing", changes: true },
  readWorkingCopy: { may: workshop, of: "thing" },
  saveWorkingCopy: { may: drawing, of: "thing", body: emptyDocument, changes: true },
  checkVoice: { may: workshop, of: "thing" },
  readPartsList: { may: workshop, of: "thing" },
  listRevisions: { may: team, of: "thing" },
  makeRevision: { may: drawing, of: "thing", body: { reason: "again" }, changes: true },
  readRevision: { may: workshop, of: "thing" },
  recomputeRevision: { may: workshop, of: "thing" },
  restoreRevision: { may: drawing, of: "thing", changes: true },
  askForReview: { may: drawing, of: "thing", body: {}, changes: true },
  decideReview: { may: ["owner", "reviewer"], of: "thing", body: { decision: "release" }, changes: true },
  compareRevisions: { may: workshop, of: "thing" },
  listComments: { may: workshop, of: "thing" },
  writeComment: { may: workshop, of: "thing", body: { revision: 1, text: "Hello" }, changes: true },
  changeComment: { may: workshop, of: "thing", body: { resolved: true }, changes: true },
  // One's own alone: the one in question is the designer's.
  deleteComment: { may: ["designer"], of: "thing", changes: true },
  listShareLinks: { may: ["owner"], of: "thing" },
  makeShareLink: { may: ["owner"], of: "thing", body: { revision: 1 }, changes: true },
  revokeShareLink: { may: ["owner"], of: "thing", changes: true },
  listMembers: { may: team, of: "team" },
  changeRole: { may: ["owner"], of: "thing", body: { role: "builder" }, changes: true },
  removeMember: { may: ["owner"], of: "thing", changes: true },
  handOverTeam: { may: ["owner"], of: "thing", body: { userId: "usr_0" }, changes: true },
  listActivity: { may: workshop, of: "team" },
  listApiKeys: { may: team, of: "self" },
  makeApiKey: { may: team, of: "self", body: { name: "key" } },
  revokeApiKey: { may: [], of: "thing", changes: true },
  listSessions: { may: team, of: "self" },
  endSession: { may: [], of: "thing", changes: true },
  readMailChoice: { may: team, of: "self" },
  chooseMail: { may: team, of: "self", body: { mentions: true } },
};

const guarded = routes.filter(({ session }) => session);

let app: RunningApp;
const people = new Map<Who, SignedIn>();
let stranger: Client;
const sql = postgres(process.env.DATABASE_URL ?? "", { max: 1 });

beforeAll(async () => {
  app = await startApp({ RATE_LIMIT_ACCOUNTS: "1000" });
  for (const who of team) people.set(who, await signIn(app.url, `${who}@demo.test`));
  const own = await signIn(app.url, "viewer@demo.test");
  const json = { name: "Elsewhere", slug: "elsewhere" };
  const made = await own.request("POST", "/api/auth/organization/create", { json });
  await own.request("POST", "/api/auth/organization/set-active", { json: { organizationId: made.body.id } });
  stranger = own;
  // Somebody whom nobody signs in as, to be changed and removed: leaving by oneself is always allowed.
  await sql`insert into users (id, name, email) values ('usr_sixth', 'Sixth', 'sixth@example.test')`;
  await sql`insert into members (id, team_id, user_id, role)
    select 'mem_sixth', id, 'usr_sixth', 'viewer' from teams where slug = 'quillfeather-electronics'`;
});
afterAll(async () => {
  await app.stop();
  await sql.end();
});

interface Things {
  voice: string;
  comment: string;
  member: string;
}

/** A voice with a revision under review and a remark on it, all by the designer. */
async function begin(): Promise<Things> {
  const designer = people.get("designer")!;
  const post = async (path: string, json: unknown) => (await designer.request("POST", path, { json })).body;
  const { id: voice } = await post("/api/voices", { name: "Under test" });
  const json = { ...emptyDocument, stages: [bandPassStage("band")] };
  await designer.request("PUT", `/api/voices/${voice}/working-copy`, { json, headers: { "if-match": '"v1"' } });
  await post(`/api/voices/${voice}/revisions`, { reason: "first" });
  await post(`/api/voices/${voice}/revisions/1/review-request`, {});
  const { id: comment } = await post(`/api/voices/${voice}/comments`, { revision: 1, text: "Mine" });
  return { voice, comment, member: "usr_sixth" };
}

const ask = (client: Client, { method, path }: Route, things: Things, body: unknown) => {
  const address = path
    .replace("{id}", path.startsWith("/api/voices/") ? things.voice : "nil_0")
    .replace("{number}", "1")
    .replace("{commentId}", things.comment)
    .replace("{linkId}", "lnk_0")
    .replace("{userId}", things.member);
  const headers = { "if-match": '"v2"' };
  return client.request(method, address, { headers, ...(body === undefined ? {} : { json: body }) });
};

/** All that the team's things hold, so that a refusal can be seen to have changed nothing. */
async function stateOf({ voice }: Things) {
  return JSON.stringify([
    await sql`select * from voices where id = ${voice}`,
    await sql`select * from working_copies where voice_id = ${voice}`,
    await sql`select * from revisions where voice_id = ${voice}`,
    await sql`select * from comments where voice_id = ${voice} order by id`,
    await sql`select * from share_links where voice_id = ${voice}`,
    await sql`select * from members order by id`,
    await sql`select count(*) from voices`,
  ]);
}

test("every route that asks for a session is in a row, and every row is a route", () => {
  expect(guarded.map(({ operationId }) => operationId).sort()).toEqual(Object.keys(rows).sort());
});

describe.each(guarded.filter(({ operationId }) => operationId in rows))("$method $path", (route) => {
  const { may, of, body, changes } = rows[route.operationId]!;

  test("is refused without a session, and with a key that is none, and nothing changes", async () => {
    const things = await begin();
    const before = await stateOf(things);
    expect((await ask(clientOf(app.url), route, things, body)).status).toBe(401);
    const forged: Client = {
      request: (method, path, options = {}) =>
        clientOf(app.url).request(method, path, {
          ...options,
          headers: { ...options.headers, authorization: `Bearer cbk_${"x".repeat(43)}` },
        }),
    };
    expect((await ask(forged, route, things, body)).status).toBe(401);
    expect(await stateOf(things)).toBe(before);
  });

  test("does not exist for an owner of another team, or shows them their own alone", async () => {
    const things = await begin();
    const before = changes && of === "thing" ? await stateOf(things) : undefined;
    const reply = await ask(stranger, route, things, body);
    if (of === "thing") expect(reply.status).toBe(404);
    else expect(JSON.stringify(reply.body ?? "")).not.toContain(things.voice);
    if (before !== undefined) expect(await stateOf(things)).toBe(before);
  });

  const refused = team.filter((who) => !may.includes(who));
  test.runIf(of !== "self" && refused.length > 0)(
    `is refused to ${refused.join(", ")}, and nothing changes`,
    async () => {
      const things = await begin();
      const before = await stateOf(things);
      for (const who of refused) {
        const { status } = await ask(people.get(who)!, route, things, body);
        // What belongs to another person does not exist either.
        expect([403, ...(may.length === 0 ? [404] : [])], who).toContain(status);
      }
      expect(await stateOf(things)).toBe(before);
    },
  );

  // What takes somebody's role away would leave the tests after it without them.
  const harmless = !["changeRole", "removeMember", "handOverTeam", "revokeShareLink"].includes(route.operationId);
  test.runIf(harmless && may.length > 0)(`lets ${may.join(", ")} pass`, async () => {
    for (const who of may) {
      const { status } = await ask(people.get(who)!, route, await begin(), body);
      // A conflict is about the state of things, not about who asks.
      expect([200, 201, 204, 409], who).toContain(status);
    }
  });
});
