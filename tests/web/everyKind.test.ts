import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { assignDesignators } from "#lib/client/stage/designators.ts";
import { startingStateWithPots, stateOfSaved } from "#lib/wire/stageState.ts";
import { startApp, type RunningApp } from "../support/app.ts";
import { signIn, type SignedIn } from "../support/client.ts";

const topologies = stageKinds.flatMap((kind) =>
  kind.topologies.map((topology) => ({ id: `${kind.id}--${topology.id}`, kind, topology })),
);

/** A stage of every topology as its calculator opens with it, named and designated as the browser does. */
function stagesToSave() {
  const taken: string[] = [];
  return topologies.map(({ id, kind, topology }) => {
    const { parts, conditions, targets } = startingStateWithPots(topology);
    const designators = assignDesignators(topology, parts, {}, taken);
    taken.push(...Object.values(designators));
    return { id, kind: kind.id, topology: topology.id, name: kind.name, parts, conditions, targets, designators };
  });
}

let app: RunningApp;
let designer: SignedIn;
let voice: string;
const stages = stagesToSave();

beforeAll(async () => {
  app = await startApp({ RATE_LIMIT_ACCOUNTS: "1000" });
  designer = await signIn(app.url, "designer@demo.test");
  const { body } = await designer.request("POST", "/api/voices", { json: { name: "One of each" } });
  voice = body.id as string;
  const copy = await designer.request("GET", `/api/voices/${voice}/working-copy`);
  const { format, links, conditions } = copy.body;
  const saved = await designer.request("PUT", `/api/voices/${voice}/working-copy`, {
    json: { format, stages, links, conditions },
    headers: { "if-match": copy.headers.get("etag") ?? "" },
  });
  expect(saved.status, JSON.stringify(saved.body)).toBe(200);
});

afterAll(() => app.stop());

describe("a stage of any kind, saved to a voice", () => {
  test.each(topologies)("$id comes back as it was, and its sheet opens", async ({ id, topology }) => {
    const { body } = await designer.request("GET", `/api/voices/${voice}/working-copy`);
    const sent = stages.find((stage) => stage.id === id)!;
    const kept = body.stages.find((stage: { id: string }) => stage.id === id);
    expect(kept).toMatchObject(JSON.parse(JSON.stringify(sent)));
    expect(stateOfSaved(topology, kept)).toEqual(startingStateWithPots(topology));
    const page = await designer.request("GET", `/voices/${voice}/stages/${id}`);
    expect(page.status).toBe(200);
    for (const mark of Object.values(sent.designators)) expect(page.body).toContain(`value="${mark}"`);
  });
});
