import { afterAll, expect, test } from "vitest";
import { startApp } from "../support/app.ts";
import { signIn } from "../support/client.ts";
import { bandPassStage, emptyDocument } from "../support/stages.ts";

const voicesAtOnce = 10;
const savesEach = 100;

let stop: () => Promise<unknown> = async () => undefined;
afterAll(() => stop());

test("after kill -9 in the middle of a thousand saves, each save that was acknowledged is there", async () => {
  const app = await startApp();
  const designer = await signIn(app.url, "designer@demo.test");
  const voices = await Promise.all(
    Array.from({ length: voicesAtOnce }, async (_, i) => {
      const { body } = await designer.request("POST", "/api/voices", { json: { name: `Killed ${i}` } });
      return { id: body.id as string, acknowledged: 0 };
    }),
  );

  let total = 0;
  let killed = false;
  const save = async (voice: (typeof voices)[number]) => {
    for (let count = 1; count <= savesEach && !killed; count += 1) {
      const stage = bandPassStage("band");
      const json = { ...emptyDocument, stages: [{ ...stage, parts: { ...stage.parts, rb: 1000 + count } }] };
      const headers = { "if-match": `"v${count}"` };
      const path = `/api/voices/${voice.id}/working-copy`;
      const reply = await designer.request("PUT", path, { json, headers }).catch(() => undefined);
      if (reply?.status !== 200) return;
      voice.acknowledged = count;
      total += 1;
      if (total === (voicesAtOnce * savesEach) / 2) {
        killed = true;
        process.kill(app.pid, "SIGKILL");
      }
    }
  };
  await Promise.all(voices.map(save));
  expect(killed).toBe(true);
  expect(total).toBeLessThan(voicesAtOnce * savesEach);
  await app.stop();

  const again = await startApp();
  stop = () => again.stop();
  const reader = await signIn(again.url, "designer@demo.test");
  for (const { id, acknowledged } of voices) {
    const { body, headers } = await reader.request("GET", `/api/voices/${id}/working-copy`);
    const kept = (body.stages[0]?.parts.rb ?? 1000) - 1000;
    // The one under way at the moment of the kill may have been kept without word of it.
    expect([acknowledged, acknowledged + 1]).toContain(kept);
    expect(headers.get("etag")).toBe(`"v${kept + 1}"`);
  }
}, 180_000);
