import postgres from "postgres";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { startMailFake, type MailFake } from "#lib/server/mail/fake.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, signIn, type SignedIn } from "../support/client.ts";

let app: RunningApp;
let mail: MailFake;
let owner: SignedIn;
let shingle: string;
const sql = postgres(process.env.DATABASE_URL ?? "", { max: 1 });

beforeAll(async () => {
  mail = await startMailFake();
  app = await startApp({ SMTP_URL: mail.url });
  owner = await signIn(app.url, "owner@demo.test");
  const { body } = await owner.request("GET", "/api/voices?name=Shingle");
  shingle = body.voices[0].id;
});
afterAll(async () => {
  await app.stop();
  await mail.close();
  await sql.end();
});

const share = async (): Promise<{ id: string; path: string }> => {
  const path = `/api/voices/${shingle}/share-links`;
  const { status, body } = await owner.request("POST", path, { json: { revision: 1 } });
  expect([status, body.url]).toEqual([201, expect.stringMatching(new RegExp(`^${app.url}/share/[\\w-]{43}$`))]);
  return { id: body.id, path: body.url.slice(app.url.length) };
};
const guest = () => clientOf(app.url);

describe("the address of a guest link", () => {
  test("shows the revision without an account, kept out of search engines, caches and referrers", async () => {
    const { path } = await share();
    const { status, headers, body } = await guest().request("GET", path, { headers: { accept: "text/html" } });
    expect(status).toBe(200);
    expect(headers.get("x-robots-tag")).toContain("noindex");
    expect(headers.get("referrer-policy")).toBe("no-referrer");
    expect(headers.get("cache-control")).toBe("no-store");
    expect(body).toContain("Shingle");
    for (const secret of ["Quillfeather", shingle, "@demo.test"]) expect(body).not.toContain(secret);
  });

  test("gives its data as JSON, which counts as a download", async () => {
    const { id, path } = await share();
    const { status, headers, body } = await guest().request("GET", path, { headers: { accept: "application/json" } });
    expect([status, headers.get("content-type")]).toEqual([200, "application/json"]);
    expect(body).toMatchObject({ voice: "Shingle", revision: 1, status: "released", preparedBy: "Dario Westerby" });
    const deeds =
      await sql`select action, actor_id from audit_events where detail ->> 'link' = ${id} and action <> 'shareLink.make'`;
    expect(deeds).toMatchObject([{ action: "shareLink.download", actor_id: null }]);
  });

  test("opens no other address of the team", async () => {
    const { path } = await share();
    const token = path.slice("/share/".length);
    for (const address of [`/api/voices/${shingle}`, `/api/voices/${shingle}/revisions/1`, "/api/team/members"]) {
      const headers = { authorization: `Bearer ${token}` };
      expect((await guest().request("GET", address)).status).toBe(401);
      expect((await guest().request("GET", address, { headers })).status).toBe(401);
    }
  });

  test("that is closed or was never given out is not found, as a page and as JSON", async () => {
    const { id, path } = await share();
    expect((await owner.request("DELETE", `/api/voices/${shingle}/share-links/${id}`)).status).toBe(204);
    for (const address of [path, `/share/${"a".repeat(43)}`, "/share/x"]) {
      for (const accept of ["text/html", "application/json"]) {
        expect((await guest().request("GET", address, { headers: { accept } })).status, `${address} ${accept}`).toBe(
          404,
        );
      }
    }
  });
});

describe("lists to be taken away", () => {
  test.each([
    ["revisions", () => `/api/voices/${shingle}/revisions`, "Revision,Status"],
    ["activity", () => "/api/team/activity", "When (UTC),Who"],
    ["a comparison", () => `/api/voices/${shingle}/compare?from=1&to=2`, "what,stage,designator"],
  ])("%s come as CSV by Accept, and by the address", async (_, path, head) => {
    const byAccept = await owner.request("GET", path(), { headers: { accept: "text/csv" } });
    expect(byAccept.headers.get("content-type")).toBe("text/csv; charset=utf-8");
    expect(byAccept.body).toMatch(new RegExp(`^${head.replace(/[()]/g, "\\$&")}`));
    const byAddress = await owner.request("GET", `${path()}${path().includes("?") ? "&" : "?"}format=csv`);
    expect(byAddress.body).toMatch(new RegExp(`^${head.replace(/[()]/g, "\\$&")}`));
  });
});

test("the link at the foot of a mention stops such mails by one press, and looking at it does not", async () => {
  const json = { revision: 1, text: "@Reni Okparavo, look" };
  const mention = () => owner.request("POST", `/api/voices/${shingle}/comments`, { json });
  const mails = () => mail.list().filter(({ to }) => to.includes("reviewer@demo.test"));
  await mention();
  const [, address = ""] = /(\/unsubscribe\?token=\S+)/.exec(mails()[0]?.text ?? "") ?? [];
  const looked = await guest().request("GET", address);
  expect([looked.status, looked.body]).toEqual([200, expect.stringContaining("Stop these mails")]);
  await mention();
  expect(mails()).toHaveLength(2);
  // As a mail program posts it (RFC 8058): from no page, with a form for its body.
  const headers = { "content-type": "application/x-www-form-urlencoded" };
  const pressed = await guest().request("POST", address, { text: "List-Unsubscribe=One-Click", headers });
  expect([pressed.status, pressed.body]).toEqual([200, expect.stringContaining("Done.")]);
  await mention();
  expect(mails()).toHaveLength(2);
  expect((await guest().request("POST", "/unsubscribe?token=usr_x.forged", { text: "", headers })).status).toBe(404);
});
