import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import {
  changeWorkingCopy,
  saveWorkingCopy,
  withoutStage,
  withStage,
  type StoredStage,
  type WorkingCopyDocument,
} from "#lib/client/workingCopy.ts";

const stage = (id: string, name = id): StoredStage => ({
  id,
  kind: "band-pass",
  topology: "multiple-feedback",
  name,
  parts: {},
  conditions: {},
  targets: {},
  designators: {},
});
const holding = (...stages: StoredStage[]): WorkingCopyDocument => ({ format: 1, stages, links: [], conditions: {} });
const linked: WorkingCopyDocument = {
  ...holding(stage("a"), stage("b"), stage("c")),
  links: [
    { id: "ab", from: { stage: "a", port: "out" }, to: { stage: "b", port: "in" } },
    { id: "bc", from: { stage: "b", port: "out" }, to: { stage: "c", port: "in" } },
  ],
};

describe("changes of a document", () => {
  test("withStage replaces a stage in its place and adds a new one at the end", () => {
    const document = withStage(withStage(holding(stage("a"), stage("b")), stage("a", "renamed")), stage("c"));
    expect(document.stages.map(({ name }) => name)).toEqual(["renamed", "b", "c"]);
  });

  test("withoutStage takes the links at both ends along and leaves the rest", () => {
    const document = withoutStage(linked, "a");
    expect(document.stages.map(({ id }) => id)).toEqual(["b", "c"]);
    expect(document.links.map(({ id }) => id)).toEqual(["bc"]);
  });
});

describe("saving", () => {
  const fetch = vi.fn<typeof globalThis.fetch>();
  const answer = (status: number, body: unknown, etag?: string) =>
    new Response(JSON.stringify(body), { status, headers: etag ? { etag } : {} });

  beforeEach(() => {
    fetch.mockReset();
    vi.stubGlobal("fetch", fetch);
  });
  afterEach(() => vi.unstubAllGlobals());

  test("sends the ETag last read and returns the new one", async () => {
    fetch.mockResolvedValueOnce(answer(200, holding(stage("a")), '"v2"'));
    const outcome = await saveWorkingCopy("voi_1", { etag: '"v1"', document: holding(stage("a")) });
    expect(outcome).toMatchObject({ kind: "saved", copy: { etag: '"v2"' } });
    const [path, init] = fetch.mock.calls[0] ?? [];
    expect(path).toBe("/api/voices/voi_1/working-copy");
    expect(new Headers(init?.headers).get("if-match")).toBe('"v1"');
  });

  test.each([
    [
      "a stale copy brings the newer one",
      answer(412, { current: holding(stage("z")) }, '"v9"'),
      { kind: "conflict", current: { etag: '"v9"' } },
    ],
    ["an expired session is told apart", answer(401, { title: "Sign in first" }), { kind: "signed-out" }],
    [
      "faults keep their paths",
      answer(422, { detail: "No.", errors: [{ path: "parts.ra", message: "Too small." }] }),
      { kind: "refused", errors: [{ path: "parts.ra", message: "Too small." }] },
    ],
    [
      "an answer that is no JSON counts as unreachable",
      new Response("<html>", { status: 502 }),
      { kind: "unreachable" },
    ],
  ])("%s", async (_contract, response, expected) => {
    fetch.mockResolvedValueOnce(response);
    expect(await saveWorkingCopy("voi_1", { etag: '"v1"', document: holding() })).toMatchObject(expected);
  });

  test("a lost connection is an outcome, not an exception", async () => {
    fetch.mockRejectedValueOnce(new TypeError("failed to fetch"));
    expect(await saveWorkingCopy("voi_1", { etag: '"v1"', document: holding() })).toEqual({ kind: "unreachable" });
  });

  test("changeWorkingCopy makes its change again on the newer copy and keeps what others saved", async () => {
    fetch.mockResolvedValueOnce(answer(412, { current: holding(stage("a"), stage("theirs")) }, '"v2"'));
    fetch.mockResolvedValueOnce(answer(200, holding(stage("theirs")), '"v3"'));
    const outcome = await changeWorkingCopy("voi_1", { etag: '"v1"', document: holding(stage("a")) }, (document) =>
      withoutStage(document, "a"),
    );
    expect(outcome).toMatchObject({ kind: "saved", copy: { etag: '"v3"' } });
    const second = fetch.mock.calls[1]?.[1];
    expect(new Headers(second?.headers).get("if-match")).toBe('"v2"');
    expect(JSON.parse(String(second?.body)).stages.map(({ id }: StoredStage) => id)).toEqual(["theirs"]);
  });
});
