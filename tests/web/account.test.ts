import postgres from "postgres";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startMailFake, type MailFake } from "#lib/server/mail/fake.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, cookiesOf, signIn } from "../support/client.ts";

let app: RunningApp;
let mail: MailFake;
const sql = postgres(process.env.DATABASE_URL ?? "", { max: 1 });

beforeAll(async () => {
  mail = await startMailFake();
  app = await startApp({ SMTP_URL: mail.url, RATE_LIMIT_ACCOUNTS: "1000" });
});

afterAll(async () => {
  await app.stop();
  await mail.close();
  await sql.end();
});

const password = "a long enough word";

async function signUp(email: string, name = "Juno Applewhite") {
  return clientOf(app.url).request("POST", "/api/auth/sign-up/email", { json: { name, email, password } });
}

const mailsTo = (email: string) => mail.list().filter(({ to }) => to.includes(email));

function linkIn(text: string): string {
  const [link] = /http:\/\/\S+/.exec(text) ?? [];
  if (!link) throw new Error(`no link in: ${text}`);
  return link;
}

describe("signing up", () => {
  test("sends a mail whose link verifies the address and signs in; only then does the password work", async () => {
    const email = "juno@example.test";
    expect((await signUp(email)).status).toBe(200);

    const early = await clientOf(app.url).request("POST", "/api/auth/sign-in/email", { json: { email, password } });
    expect(early.status).toBe(403);
    expect(early.headers.get("content-type")).toBe("application/problem+json");
    expect(early.body).toMatchObject({ status: 403, code: "EMAIL_NOT_VERIFIED" });

    const [letter] = mailsTo(email);
    expect(letter?.subject).toMatch(/confirm/i);
    const link = linkIn(letter?.text ?? "");
    expect(link.startsWith(`${app.url}/api/auth/verify-email`)).toBe(true);
    expect(letter?.html).toContain("Confirm this address");

    const verified = await clientOf(app.url).request("GET", link.slice(app.url.length));
    expect(verified.status).toBe(302);
    const voices = await clientOf(app.url, cookiesOf(verified)).request("GET", "/api/voices");
    expect(voices.status).toBe(200);

    await expect(signIn(app.url, email, password)).resolves.toBeDefined();
  });

  test("gives exactly one team, owned by the new person, however often they sign in", async () => {
    const email = "otis@example.test";
    await signUp(email, "Otis Märzbach");
    await sql`update users set email_verified = true where email = ${email}`;
    await Promise.all(Array.from({ length: 4 }, () => signIn(app.url, email, password)));
    const rows = await sql`
      select m.role, t.name, t.slug from members m join users u on u.id = m.user_id join teams t on t.id = m.team_id
      where u.email = ${email}`;
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ role: "owner", name: "Otis Märzbach’s team" });
    expect(rows[0]?.slug).toMatch(/^otis-marzbach-/);
    const person = await signIn(app.url, email, password);
    expect((await person.request("POST", "/api/voices", { json: { name: "First" } })).status).toBe(201);
  });

  test("with a known address says nothing to the stranger and tells the owner of the address", async () => {
    const email = "mira@example.test";
    const first = await signUp(email);
    const second = await signUp(email, "Somebody Else");
    expect(second.status).toBe(first.status);
    expect(Object.keys(second.body)).toEqual(Object.keys(first.body));
    expect(mailsTo(email)[0]?.subject).toMatch(/already have/);
  });

  test("writes a name into the mail as text, never as markup", async () => {
    const email = "tag@example.test";
    await signUp(email, "<b>Bold</b>");
    expect(mailsTo(email)[0]?.html).toContain("&lt;b&gt;Bold");
  });

  test.each([
    ["an empty name", { name: "  ", email: "a1@example.test", password }],
    ["a name of 121 characters", { name: "x".repeat(121), email: "a2@example.test", password }],
    ["a short password", { name: "A", email: "a3@example.test", password: "short" }],
    ["no address", { name: "A", email: "nobody", password }],
    ["an address too long for the database", { name: "A", email: `${"x".repeat(400)}@example.test`, password }],
    ["nothing", {}],
  ])("with %s is refused with a problem document", async (_, json) => {
    const reply = await clientOf(app.url).request("POST", "/api/auth/sign-up/email", { json });
    expect(reply.status).toBeGreaterThanOrEqual(400);
    expect(reply.status).toBeLessThan(500);
    expect(reply.headers.get("content-type")).toBe("application/problem+json");
    expect(reply.body).toMatchObject({
      type: expect.any(String),
      title: expect.any(String),
      detail: expect.any(String),
    });
    expect(reply.body.detail).not.toMatch(/query|constraint|insert/i);
  });
});

describe("signing in", () => {
  test("sets one cookie that scripts of the page cannot read and other sites do not send", async () => {
    const json = { email: "owner@demo.test", password: "clatter-demo-1" };
    const reply = await clientOf(app.url).request("POST", "/api/auth/sign-in/email", { json });
    const cookie = reply.headers.getSetCookie().find((line) => line.startsWith("clatterbench.session_token="));
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
    expect(cookie).not.toMatch(/Secure/i);
  });

  test.each([
    ["a wrong password", { email: "owner@demo.test", password: "clatter-demo-2" }],
    ["an unknown address", { email: "nobody@demo.test", password: "clatter-demo-1" }],
  ])("with %s gets 401 and the same words", async (_, json) => {
    const reply = await clientOf(app.url).request("POST", "/api/auth/sign-in/email", { json });
    expect(reply.status).toBe(401);
    expect(reply.body).toMatchObject({ code: "INVALID_EMAIL_OR_PASSWORD" });
  });

  test("works from a page at any loopback name, and not from another site", async () => {
    const json = { email: "owner@demo.test", password: "clatter-demo-1" };
    const from = (origin: string) =>
      clientOf(app.url).request("POST", "/api/auth/sign-in/email", { json, headers: { origin } });
    expect((await from(app.url)).status).toBe(200);
    expect((await from("https://elsewhere.test")).status).toBe(403);
    expect((await from("null")).status).toBe(403);
  });

  test("ends with signing out", async () => {
    const owner = await signIn(app.url, "owner@demo.test");
    expect((await owner.request("POST", "/api/auth/sign-out", { json: {} })).status).toBe(200);
    expect((await owner.request("GET", "/api/voices")).status).toBe(401);
  });

  test("that has expired counts as none", async () => {
    const owner = await signIn(app.url, "owner@demo.test");
    const token = decodeURIComponent(/session_token=([^;.]+)/.exec(owner.cookie)?.[1] ?? "");
    const changed = await sql`update sessions set expires_at = now() - interval '1 minute' where token = ${token}`;
    expect(changed.count).toBe(1);
    const reply = await owner.request("POST", "/api/voices", { json: { name: "Typed while it expired" } });
    expect(reply.status).toBe(401);
    expect(reply.body.detail).toMatch(/sign in/i);
  });

  test("with a forged cookie counts as none", async () => {
    const reply = await clientOf(app.url, "clatterbench.session_token=made.up").request("GET", "/api/voices");
    expect(reply.status).toBe(401);
  });
});

describe("a team's members", () => {
  const invite = async (as: string, role: string, email: string) =>
    (await signIn(app.url, as)).request("POST", "/api/auth/organization/invite-member", { json: { email, role } });

  test("are invited by an owner, by mail", async () => {
    expect((await invite("owner@demo.test", "reviewer", "newcomer@example.test")).status).toBe(200);
    expect(mailsTo("newcomer@example.test")[0]?.text).toMatch(/Quillfeather Electronics as reviewer/);
  });

  test.each(["designer", "reviewer", "builder", "viewer"])("are not invited by a %s", async (role) => {
    const reply = await invite(`${role}@demo.test`, "viewer", "uninvited@example.test");
    expect(reply.status).toBe(403);
    expect(mailsTo("uninvited@example.test")).toEqual([]);
  });

  test.each(["admin", "member", "owner,designer", "x"])("never get the role %s", async (role) => {
    const reply = await invite("owner@demo.test", role, "odd@example.test");
    expect(reply.status).toBeGreaterThanOrEqual(400);
    expect(reply.status).toBeLessThan(500);
  });

  test.each(["designer", "viewer"])("keep their roles when a %s tries to become owner", async (role) => {
    const person = await signIn(app.url, `${role}@demo.test`);
    const [member] = await sql`
      select m.id, m.user_id from members m join users u on u.id = m.user_id where u.email = ${`${role}@demo.test`}`;
    const { id: memberId, user_id: userId } = member as { id: string; user_id: string };
    const ours = await person.request("PATCH", `/api/team/members/${userId}`, { json: { role: "owner" } });
    expect(ours.status).toBe(403);
    // The sign-in library has a way of its own, which is closed: ours alone keeps the log of deeds.
    const json = { memberId, role: "owner" };
    const theirs = await person.request("POST", "/api/auth/organization/update-member-role", { json });
    expect(theirs.status).toBe(404);
    expect(await sql`select role from members where id = ${memberId}`).toMatchObject([{ role }]);
  });
});
