import { afterAll, beforeAll, beforeEach, describe, expect, test } from "vitest";
import { startApp, type RunningApp } from "../support/app.ts";
import { signIn, type Reply, type SignedIn } from "../support/client.ts";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

let app: RunningApp;
let designer: SignedIn;
let path: string;

beforeAll(async () => {
  app = await startApp({ RATE_LIMIT_ACCOUNTS: "1000" });
  designer = await signIn(app.url, "designer@demo.test");
});

afterAll(() => app.stop());

beforeEach(async () => {
  const { body } = await designer.request("POST", "/api/voices", { json: { name: "Under test" } });
  path = `/api/voices/${body.id}/working-copy`;
});

const read = () => designer.request("GET", path);
const save = (etag: string | null, json: unknown) =>
  designer.request("PUT", path, { json, headers: etag === null ? {} : { "if-match": etag } });
const etagOf = (reply: Reply) => reply.headers.get("etag");

const withStages = (...stages: unknown[]) => ({ ...emptyDocument, stages });

describe("saving a working copy", () => {
  test("with the ETag last read keeps it, and each save gives the ETag of the next", async () => {
    const first = await save(etagOf(await read()), withStages(bandPassStage("a", { ra: "R1" })));
    expect(first.status).toBe(200);
    const second = await save(etagOf(first), withStages(bandPassStage("a", { ra: "R1" }), bandPassStage("b")));
    expect(second.status).toBe(200);
    const now = await read();
    expect(etagOf(now)).toBe(etagOf(second));
    expect(now.body.stages).toMatchObject([{ id: "a", designators: { ra: "R1" } }, { id: "b" }]);
    const voice = await designer.request("GET", path.replace("/working-copy", ""));
    expect(voice.body).toMatchObject({ stageCount: 2, updatedAt: now.body.updatedAt });
  });

  test("with a stale ETag gets 412 with the current copy and its ETag, and changes nothing", async () => {
    const old = etagOf(await read());
    const newer = await save(old, withStages(bandPassStage("theirs")));
    const reply = await save(old, withStages(bandPassStage("mine")));
    expect(reply.status).toBe(412);
    expect(reply.headers.get("content-type")).toBe("application/problem+json");
    expect(reply.body.current.stages).toMatchObject([{ id: "theirs" }]);
    expect(etagOf(reply)).toBe(etagOf(newer));
    const merged = [...reply.body.current.stages, bandPassStage("mine")];
    expect((await save(etagOf(reply), { ...reply.body.current, stages: merged })).status).toBe(200);
  });

  test.each([null, "*"])("with If-Match %s gets 428, and changes nothing", async (etag) => {
    const before = await read();
    expect((await save(etag, withStages(bandPassStage("a")))).status).toBe(428);
    expect((await read()).body).toEqual(before.body);
  });

  test.each(["v1", '"other"', '"v0"', '"v99"'])("with the ETag %s gets 412", async (etag) => {
    expect((await save(etag, emptyDocument)).status).toBe(412);
  });

  test("answers a value written as 4k7 with 4700", async () => {
    const stage = { ...bandPassStage("a"), parts: { ...bandPassStage("a").parts, ra: "4k7", c1: "100n" } };
    const { body } = await save('"v1"', withStages(stage));
    expect(body.stages[0].parts.ra).toBe(4700);
    expect(body.stages[0].parts.c1).toBeCloseTo(1e-7, 15);
  });
});

describe("a document that cannot be used", () => {
  const stage = bandPassStage("a");
  test.each([
    ["an extra field", { ...emptyDocument, notes: "x" }, "notes"],
    ["an extra field in a stage", withStages({ ...stage, colour: "red" }), "stages.0.colour"],
    ["text as stages", { ...emptyDocument, stages: "none" }, "stages"],
    ["no links", { format: 1, stages: [], conditions: {} }, "links"],
    ["text that is no number", withStages({ ...stage, parts: { ...stage.parts, ra: "lots" } }), "stages.0.parts.ra"],
    ["NaN as text", withStages({ ...stage, parts: { ...stage.parts, ra: "NaN" } }), "stages.0.parts.ra"],
    ["1e300", withStages({ ...stage, parts: { ...stage.parts, ra: 1e300 } }), "stages.0.parts.ra"],
    ["a negative part", withStages({ ...stage, parts: { ...stage.parts, ra: -1 } }), "stages.0.parts.ra"],
    ["null for a part", withStages({ ...stage, parts: { ...stage.parts, ra: null } }), "stages.0.parts.ra"],
    ["an unknown kind", withStages({ ...stage, kind: "kazoo" }), "stages.0.kind"],
    ["an unknown part", withStages({ ...stage, parts: { ...stage.parts, zz: 1 } }), "stages.0.parts.zz"],
    ["a designator twice", withStages(bandPassStage("a", { ra: "R1", rf: "R1" })), "stages.0.designators.rf"],
    ["two stages of one id", withStages(stage, stage), "stages.1.id"],
  ])("for %s gets 422 with the place, and nothing changes", async (_, document, place) => {
    const before = await read();
    const reply = await save('"v1"', document);
    expect(reply.status).toBe(422);
    expect(reply.body.errors.map((fault: { path: string }) => fault.path)).toContain(place);
    const after = await read();
    expect(after.body).toEqual(before.body);
    expect(etagOf(after)).toBe(etagOf(before));
  });

  const send = (text: string, type = "application/json") =>
    designer.request("PUT", path, { text, headers: { "if-match": '"v1"', "content-type": type } });

  test.each([
    ["an empty body", "", "application/json", 400],
    ["half a document", '{"stages":[', "application/json", 400],
    ["a bare NaN", '{"format":NaN}', "application/json", 400],
    ["a form", "stages=1", "application/x-www-form-urlencoded", 415],
    ["a list", "[]", "application/json", 422],
    ["1.2 MB", JSON.stringify({ ...emptyDocument, notes: "x".repeat(1_200_000) }), "application/json", 413],
    ["2 MB", JSON.stringify({ ...emptyDocument, notes: "x".repeat(2_000_000) }), "application/json", 413],
  ])("being %s gets a problem document", async (_, text, type, status) => {
    const reply = await send(text, type);
    expect(reply.status).toBe(status);
    expect(reply.headers.get("content-type")).toMatch(/^application\/problem\+json/);
    expect(reply.body).toMatchObject({ status, title: expect.any(String), detail: expect.any(String) });
  });
});

describe("reading a working copy", () => {
  test("again with its ETag answers 304", async () => {
    const etag = etagOf(await read()) ?? "";
    const again = await designer.request("GET", path, { headers: { "if-none-match": etag } });
    expect(again.status).toBe(304);
    await save(etag, withStages(bandPassStage("a")));
    expect((await designer.request("GET", path, { headers: { "if-none-match": etag } })).status).toBe(200);
  });
});
