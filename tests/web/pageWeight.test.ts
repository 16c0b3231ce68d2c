import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { clientOf, signIn, type SignedIn } from "../support/client.ts";
import { gzipSize, loadedChunks, reached, scriptsOf, type LoadedChunk } from "../support/pageScripts.ts";

/**
 * Bytes of compressed script: what comes before any plot is near the screen, all that a page can ask for by itself, and
 * what its panels add once somebody opens them.
 */
const most = { first: 120_000, all: 261_000, panels: 60_000 };
const isPanel = (script: string) => /\/\w+Panel\.[^/]+\.js$/.test(script);

let app: RunningApp;
let designer: SignedIn;

beforeAll(async () => {
  app = await startApp({ RATE_LIMIT_ACCOUNTS: "1000" });
  designer = await signIn(app.url, "designer@demo.test");
});

afterAll(() => app.stop());

/** Script sizes of a page that works with one topology: its own chunk is fetched at once, the others' never. */
async function weigh(path: string, kind: string, topology: string, client = clientOf(app.url)) {
  const { status, body } = await client.request("GET", path);
  expect(status, path).toBe(200);
  const entries = scriptsOf(body as string);
  const shell = reached(entries);
  const chunks = loadedChunks(reached(entries, () => true));
  const inPage = loadedChunks(shell).filter((chunk) => chunk.kind === kind);
  const own = inPage.find((chunk) => chunk.topology === topology) ?? inPage.find((chunk) => !chunk.topology);
  if (!own) throw new Error(`Nothing in the page of ${kind} loads it.`);
  const isOwn = (chunk: LoadedChunk) => chunk.kind === kind && chunk.topology === own.topology;
  const others = new Set(chunks.filter((chunk) => !isOwn(chunk)).map(({ script }) => script));
  const first = reached([...entries, own.script]);
  const all = reached([...entries, own.script], (script) => !others.has(script) && !isPanel(script));
  const opened = reached([...entries, own.script], (script) => !others.has(script));
  const panels = [...opened].filter((script) => !all.has(script));
  return {
    ...{ own, chunks, shell, first, all, panels },
    sizes: { first: gzipSize(first), all: gzipSize(all), panels: gzipSize(panels) },
  };
}

const pages = stageKinds.flatMap((kind) => kind.topologies.map(({ id }) => ({ kind: kind.id, topology: id })));
const alive = stageKinds.find(({ place }) => place === "audio")!;

function expectLittle({ own, chunks, shell, first, all, sizes }: Awaited<ReturnType<typeof weigh>>) {
  // Every kind can be loaded, and none comes along unasked but the page's own.
  expect([...new Set(chunks.map(({ kind }) => kind))].sort()).toEqual(stageKinds.map(({ id }) => id).sort());
  expect(chunks.filter(({ script }) => shell.has(script))).toEqual([]);
  const foreign = chunks.filter(({ kind, script }) => kind !== own.kind && first.has(script));
  expect(foreign).toEqual([]);
  // What the page draws with and what it draws later are both seen, or the sums would prove nothing.
  expect(sizes.first).toBeGreaterThan(60_000);
  expect(gzipSize([...all].filter((script) => !first.has(script)))).toBeGreaterThan(60_000);
  expect(sizes.first).toBeLessThan(most.first);
  expect(sizes.all).toBeLessThan(most.all);
  expect(sizes.panels).toBeLessThan(most.panels);
}

describe("what a page has the browser fetch", () => {
  test.each(pages)("$kind, $topology: one network, and little enough", async ({ kind, topology }) => {
    const weight = await weigh(`/calculators/${kind}?t=${topology}`, kind, topology);
    expectLittle(weight);
    expect(weight.panels.some(isPanel)).toBe(true);
  });

  test("the first page: the stage that is alive on it, and little enough", async () => {
    expectLittle(await weigh("/", alive.id, alive.topologies[0]!.id));
  });

  test("a stage of a voice: its own network, and little enough", async () => {
    const { body: list } = await designer.request("GET", "/api/voices");
    const voice = list.voices[0].id as string;
    const { body: copy } = await designer.request("GET", `/api/voices/${voice}/working-copy`);
    const { id, kind, topology } = copy.stages[0] as { id: string; kind: string; topology: string };
    expectLittle(await weigh(`/voices/${voice}/stages/${id}`, kind, topology, designer));
  });
});
