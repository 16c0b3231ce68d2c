import { Refusal } from "#lib/server/errors.ts";
import { problemResponse } from "#lib/server/problem.ts";
import { readJson, type Received } from "#lib/server/request.ts";
import { expectedVersions, versionsIn } from "#lib/server/workingCopies/etag.ts";
import { describe, expect, test } from "vitest";
import { z } from "zod";

const schema = z.strictObject({ name: z.string().min(1).max(5), parts: z.strictObject({ ra: z.number() }) });

const send = (body: BodyInit | undefined, type = "application/json"): Received => ({
  request: new Request("http://clatterbench.test/", {
    method: "POST",
    headers: { "content-type": type },
    ...(body === undefined ? {} : { body }),
  }),
  locals: {},
});

/** As the gate hands a body over: read, and found in the locals. */
async function sendRead(body: BodyInit | undefined, type?: string): Promise<Received> {
  const { request } = send(body, type);
  return { request, locals: { body: new Uint8Array(await request.clone().arrayBuffer()) } };
}

async function refusalOf(received: Received): Promise<Refusal> {
  try {
    await readJson(received, schema);
  } catch (error) {
    if (error instanceof Refusal) return error;
    throw error;
  }
  throw new Error("it was accepted");
}

describe("reading a JSON body", () => {
  test("gives what passed the schema", async () => {
    const good = { name: "ok", parts: { ra: 1 } };
    expect(await readJson(send(JSON.stringify(good)), schema)).toEqual(good);
    expect(await readJson(await sendRead(JSON.stringify(good)), schema)).toEqual(good);
  });

  test.each([
    ["nothing", undefined, "malformed-json"],
    ["blanks", "  ", "malformed-json"],
    ["NaN", '{"name":NaN}', "malformed-json"],
    ["half an object", '{"name":', "malformed-json"],
    ["bytes that are no UTF-8", new Uint8Array([0x22, 0xff, 0x22]), "malformed-json"],
    ["2 MB", JSON.stringify({ name: "x".repeat(2_000_000) }), "too-large"],
    ["a list", "[]", "invalid-input"],
    ["null", "null", "invalid-input"],
  ])("refuses %s", async (_, body, code) => {
    expect(await refusalOf(send(body))).toMatchObject({ code });
    expect(await refusalOf(await sendRead(body))).toMatchObject({ code });
  });

  test.each(["text/plain", "application/x-www-form-urlencoded", ""])("refuses the type '%s'", async (type) => {
    expect(await refusalOf(send("{}", type))).toMatchObject({ code: "wrong-media-type" });
  });

  test("names the path of each fault, also of each extra field", async () => {
    const refusal = await refusalOf(send(JSON.stringify({ name: "", parts: { ra: "x", rz: 1 }, extra: 1 })));
    expect(refusal.errors.map(({ path }) => path).sort()).toEqual(["extra", "name", "parts.ra", "parts.rz"]);
    expect(refusal.errors).toContainEqual({ path: "parts.ra", message: "This should be a number." });
  });

  test("says that a field is missing", async () => {
    const refusal = await refusalOf(send("{}"));
    expect(refusal.errors).toContainEqual({ path: "name", message: "Missing: text belongs here." });
  });
});

describe("a problem document", () => {
  test("of an unforeseen error holds none of its text", async () => {
    const response = problemResponse(new Error("column users.secret does not exist"));
    expect(response.status).toBe(500);
    expect(response.headers.get("content-type")).toBe("application/problem+json");
    expect(await response.text()).not.toMatch(/secret|column/);
  });

  test("of an unreachable database is 503, however deep the cause lies", () => {
    const lost = Object.assign(new Error("connect"), { code: "ECONNREFUSED" });
    const response = problemResponse(new Error("query", { cause: new Error("driver", { cause: lost }) }));
    expect(response.status).toBe(503);
    expect(response.headers.get("retry-after")).toBe("5");
  });

  test("keeps its own members when extensions use their names", async () => {
    const refusal = new Refusal("stale-copy", "Newer.", { members: { status: 200, current: 1 } });
    expect(await problemResponse(refusal).json()).toMatchObject({ status: 412, current: 1 });
  });
});

describe("If-Match", () => {
  test.each([null, "", " ", "*"])("of %j does not count as one", (header) => {
    expect(() => expectedVersions(header)).toThrow(expect.objectContaining({ code: "precondition-required" }));
  });

  test.each([
    ['"v3"', [3]],
    ['W/"v3"', [3]],
    ['"v3", "v12"', [3, 12]],
    ['"other"', []],
    ["v3", []],
    ['"v99999999999999999999"', []],
  ])("of %s names %j", (header, versions) => {
    expect(versionsIn(header)).toEqual(versions);
  });
});
