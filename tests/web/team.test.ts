import postgres from "postgres";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startMailFake, type MailFake } from "#lib/server/mail/fake.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, signIn, type SignedIn } from "../support/client.ts";

let app: RunningApp;
let mail: MailFake;
let owner: SignedIn;
let teamId: string;
const sql = postgres(process.env.DATABASE_URL ?? "", { max: 1 });
const password = "a long enough word";

beforeAll(async () => {
  mail = await startMailFake();
  app = await startApp({ SMTP_URL: mail.url, RATE_LIMIT_ACCOUNTS: "1000" });
  owner = await signIn(app.url, "owner@demo.test");
  [{ id: teamId }] = await sql`select id from teams where slug = 'quillfeather-electronics'`;
});

afterAll(async () => {
  await app.stop();
  await mail.close();
  await sql.end();
});

const mailsTo = (email: string) => mail.list().filter(({ to }) => to.includes(email));
const post = (who: { request: SignedIn["request"] }, path: string, json: unknown) =>
  who.request("POST", path, { json });

/** A person with an account of their own, signed in. */
async function person(email: string): Promise<SignedIn> {
  await post(clientOf(app.url), "/api/auth/sign-up/email", { name: `Person ${email}`, email, password });
  await sql`update users set email_verified = true where email = ${email}`;
  return signIn(app.url, email, password);
}

async function invite(email: string, role = "reviewer"): Promise<string> {
  const reply = await post(owner, "/api/auth/organization/invite-member", { email, role, organizationId: teamId });
  expect(reply.status).toBe(200);
  return reply.body.id;
}

const roleOf = async (email: string) =>
  (
    await sql`select m.role from members m join users u on u.id = m.user_id where u.email = ${email} and m.team_id = ${teamId}`
  )[0]?.role;

describe("an invitation", () => {
  test("reaches its address by mail, and accepted makes a member of that role", async () => {
    const email = "invited@example.test";
    const id = await invite(email);
    const [letter] = mailsTo(email);
    expect(letter?.subject).toBe("Join Quillfeather Electronics on Clatterbench");
    expect(letter?.text).toContain(`${app.url}/invitations/${id}`);
    expect(letter?.html).toContain("See the invitation");

    const shown = await clientOf(app.url).request("GET", `/invitations/${id}`);
    expect([shown.status, shown.body]).toEqual([200, expect.stringContaining("Join Quillfeather Electronics")]);

    const invited = await person(email);
    const accepted = await post(invited, "/api/auth/organization/accept-invitation", { invitationId: id });
    expect(accepted.status).toBe(200);
    expect(await roleOf(email)).toBe("reviewer");
    const again = await post(invited, "/api/auth/organization/accept-invitation", { invitationId: id });
    expect(again.status).toBeGreaterThanOrEqual(400);
    const deeds = await sql`select action, detail from audit_events where subject_id = ${id} order by at`;
    expect(deeds.map(({ action }) => action)).toEqual(["team.invite", "invitation.accept"]);
  });

  test("is not accepted by somebody else", async () => {
    const id = await invite("meant@example.test");
    const other = await person("other@example.test");
    const reply = await post(other, "/api/auth/organization/accept-invitation", { invitationId: id });
    expect(reply.status).toBe(403);
    expect(await roleOf("other@example.test")).toBeUndefined();
  });

  test.each([
    [
      "declined",
      async (id: string, invited: SignedIn) =>
        post(invited, "/api/auth/organization/reject-invitation", { invitationId: id }),
    ],
    ["revoked", async (id: string) => post(owner, "/api/auth/organization/cancel-invitation", { invitationId: id })],
    [
      "expired",
      async (id: string) => sql`update invitations set expires_at = now() - interval '1 minute' where id = ${id}`,
    ],
  ])("that was %s no longer lets anybody in, and its page says so", async (what, close) => {
    const email = `${what}@example.test`;
    const id = await invite(email);
    const invited = await person(email);
    await close(id, invited);
    const reply = await post(invited, "/api/auth/organization/accept-invitation", { invitationId: id });
    expect(reply.status).toBeGreaterThanOrEqual(400);
    expect(await roleOf(email)).toBeUndefined();
    const page = await invited.request("GET", `/invitations/${id}`);
    expect(page.body).toContain("This invitation is closed.");
  });

  test("sent again arrives again and holds anew", async () => {
    const email = "twice@example.test";
    const id = await invite(email);
    await sql`update invitations set expires_at = now() + interval '1 minute' where id = ${id}`;
    const json = { email, role: "reviewer", organizationId: teamId, resend: true };
    expect((await post(owner, "/api/auth/organization/invite-member", json)).status).toBe(200);
    expect(mailsTo(email)).toHaveLength(2);
    const [held] =
      await sql`select extract(day from expires_at - now()) as days from invitations where email = ${email} and status = 'pending'`;
    expect(Number(held?.days)).toBeGreaterThan(5);
  });

  test.each(["designer", "reviewer", "builder", "viewer"])("is not sent by a %s", async (role) => {
    const who = await signIn(app.url, `${role}@demo.test`);
    const json = { email: `by-${role}@example.test`, role: "owner", organizationId: teamId };
    expect((await post(who, "/api/auth/organization/invite-member", json)).status).toBe(403);
    expect(mailsTo(json.email)).toEqual([]);
  });
});

describe("roles", () => {
  test("are changed through our own address alone, and never for another team", async () => {
    const email = "changed@example.test";
    const id = await invite(email);
    const invited = await person(email);
    await post(invited, "/api/auth/organization/accept-invitation", { invitationId: id });
    const [row] =
      await sql`select m.user_id, m.id from members m join users u on u.id = m.user_id where u.email = ${email} and m.team_id = ${teamId}`;
    const past = await post(owner, "/api/auth/organization/update-member-role", {
      memberId: row?.id,
      role: "owner",
      organizationId: teamId,
    });
    expect(past.status).toBe(404);
    const change = (who: SignedIn) =>
      who.request("PATCH", `/api/team/members/${row?.user_id}`, { json: { role: "builder" } });
    expect((await change(await signIn(app.url, "designer@demo.test"))).status).toBe(403);
    expect((await change(await person("elsewhere@example.test"))).status).toBe(404);
    expect(await roleOf(email)).toBe("reviewer");
    expect((await change(owner)).status).toBe(204);
    expect(await roleOf(email)).toBe("builder");
  });
});

describe("another e-mail address", () => {
  test("holds once the old one agreed and the new one confirmed", async () => {
    const someone = await person("before@example.test");
    const asked = await post(someone, "/api/auth/change-email", {
      newEmail: "after@example.test",
      callbackURL: "/account",
    });
    expect(asked.status).toBe(200);
    const [agree] = mailsTo("before@example.test");
    expect(agree?.subject).toBe("Change the e-mail address of your Clatterbench account");
    expect(agree?.text).toContain("after@example.test");
    const linkIn = (text = "") => /http:\/\/\S+/.exec(text)![0].slice(app.url.length);
    const agreed = await someone.request("GET", linkIn(agree?.text));
    expect(agreed.status).toBe(302);
    const [confirm] = mailsTo("after@example.test");
    expect(confirm?.subject).toMatch(/Confirm/);
    expect(await sql`select 1 from users where email = 'after@example.test'`).toHaveLength(0);
    await someone.request("GET", linkIn(confirm?.text));
    expect(await sql`select 1 from users where email = 'after@example.test'`).toHaveLength(1);
    await expect(signIn(app.url, "after@example.test", password)).resolves.toBeDefined();
  });
});

describe("sessions", () => {
  test("are listed without their tokens, and one is ended from another", async () => {
    const here = await person("sessions@example.test");
    const there = await signIn(app.url, "sessions@example.test", password);
    const { body } = await here.request("GET", "/api/account/sessions");
    expect(body.sessions).toHaveLength(2);
    expect(JSON.stringify(body)).not.toMatch(/token/i);
    const other = body.sessions.find((session: { current: boolean }) => !session.current);
    expect((await owner.request("DELETE", `/api/account/sessions/${other.id}`)).status).toBe(404);
    expect((await here.request("DELETE", `/api/account/sessions/${other.id}`)).status).toBe(204);
    expect((await there.request("GET", "/api/voices")).status).toBe(401);
    expect((await here.request("GET", "/api/voices")).status).toBe(200);
  });
});

describe("a personal key", () => {
  const withKey = (key: string) => {
    const { request } = clientOf(app.url);
    return (method: string, path: string, json?: unknown) =>
      request(method, path, { ...(json === undefined ? {} : { json }), headers: { authorization: `Bearer ${key}` } });
  };
  const make = async (who: SignedIn, name = "notebook") => {
    const reply = await post(who, "/api/account/keys", { name });
    expect(reply.status).toBe(201);
    return reply.body as { id: string; key: string; start: string };
  };

  test("is shown once, stored as a hash, and its use is noted", async () => {
    const { id, key } = await make(owner);
    expect(key).toMatch(/^cbk_[\w-]{43}$/);
    const [row] = await sql`select * from api_keys where id = ${id}`;
    expect(JSON.stringify(row)).not.toContain(key);
    expect(row?.hash).toMatch(/^[0-9a-f]{64}$/);
    expect((await withKey(key)("GET", "/api/voices")).status).toBe(200);
    const { body } = await owner.request("GET", "/api/account/keys");
    const listed = body.keys.find((one: { id: string }) => one.id === id);
    expect(listed.lastUsedAt).toMatch(/Z$/);
    expect(JSON.stringify(body)).not.toContain(key);
  });

  test("carries its owner's role, and the role they have now", async () => {
    const email = "keyholder@example.test";
    const invitation = await invite(email, "designer");
    const holder = await person(email);
    await post(holder, "/api/auth/organization/accept-invitation", { invitationId: invitation });
    const ask = withKey((await make(holder)).key);
    expect((await ask("POST", "/api/voices", { name: "By key" })).status).toBe(201);
    const [row] =
      await sql`select m.user_id from members m join users u on u.id = m.user_id where u.email = ${email} and m.team_id = ${teamId}`;
    await owner.request("PATCH", `/api/team/members/${row?.user_id}`, { json: { role: "viewer" } });
    expect((await ask("POST", "/api/voices", { name: "Again" })).status).toBe(403);
    await owner.request("DELETE", `/api/team/members/${row?.user_id}`);
    expect((await ask("GET", "/api/voices")).status).toBe(401);
  });

  test("ends at once when revoked, by its owner alone", async () => {
    const { id, key } = await make(owner);
    const designer = await signIn(app.url, "designer@demo.test");
    expect((await designer.request("DELETE", `/api/account/keys/${id}`)).status).toBe(404);
    expect((await withKey(key)("GET", "/api/voices")).status).toBe(200);
    expect((await owner.request("DELETE", `/api/account/keys/${id}`)).status).toBe(204);
    expect((await withKey(key)("GET", "/api/voices")).status).toBe(401);
  });

  test("looks after no keys and no sessions", async () => {
    const ask = withKey((await make(owner)).key);
    expect((await ask("POST", "/api/account/keys", { name: "child" })).status).toBe(403);
    expect((await ask("GET", "/api/account/sessions")).status).toBe(403);
  });

  test.each(["Bearer", "Bearer x", `Bearer cbk_${"a".repeat(43)}`])(
    "that is none is no way in: %s",
    async (authorization) => {
      const headers = { authorization, cookie: owner.cookie };
      expect((await clientOf(app.url).request("GET", "/api/voices", { headers })).status).toBe(401);
    },
  );
});

test("a sign-in is in the log of the team it leads to", async () => {
  const before =
    await sql`select count(*)::int as count from audit_events where action = 'session.begin' and team_id = ${teamId}`;
  await signIn(app.url, "builder@demo.test");
  const after =
    await sql`select count(*)::int as count from audit_events where action = 'session.begin' and team_id = ${teamId}`;
  expect(after[0]?.count).toBe(before[0]?.count + 1);
});
