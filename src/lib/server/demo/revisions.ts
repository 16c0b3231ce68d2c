import { analyseStages, libraryVersion, stepAlongSeries } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { newId, revisions, type Transaction } from "#lib/db/index.ts";
import type { WorkingCopyDocument } from "#lib/wire/workingCopy.ts";

interface Person {
  id: string;
  name: string;
}

interface DemoRevisions {
  voiceId: string;
  document: WorkingCopyDocument;
  author: Person;
  reviewer: Person;
  now: number;
}

const minute = 60_000;

/** The document as it was before its latest change: the resistor that tunes the voice's band a step lower. */
function earlier(document: WorkingCopyDocument): WorkingCopyDocument {
  const tuned = document.stages.find(({ targets }) => "centreFrequency" in targets);
  const [part, value] = Object.entries(tuned?.parts ?? {}).find(([, ohms]) => ohms > 10e3 && ohms < 50e3) ?? [];
  if (!tuned || part === undefined || value === undefined) return document;
  const before = { ...tuned, parts: { ...tuned.parts, [part]: stepAlongSeries(value, "E24", -1) } };
  return { ...document, stages: document.stages.map((stage) => (stage === tuned ? before : stage)) };
}

/** What a review looks like: a release, and a later revision that waits to be decided on. */
export async function reviseDemoVoice(tx: Transaction, { voiceId, document, author, reviewer, now }: DemoRevisions) {
  const kept = (number: number, reason: string, inputs: WorkingCopyDocument, at: Date) => ({
    ...{ id: newId("rev"), voiceId, number, reason, inputs, acceptedWarnings: [], libraryVersion },
    ...{ analysis: analyseStages(inputs, stageKinds), authorId: author.id, authorName: author.name, createdAt: at },
    ...{ askedAt: at, askedById: author.id, updatedAt: at },
  });
  const [released, asked] = [new Date(now - 90 * minute), new Date(now - 30 * minute)];
  await tx.insert(revisions).values([
    {
      ...kept(1, "first values from the bench", earlier(document), released),
      ...{ status: "released", decision: "release", decisionNote: "Sounds right on the bench." },
      ...{ decidedAt: released, decidedById: reviewer.id, decidedByName: reviewer.name },
    },
    { ...kept(2, "centre back on its target", document, asked), status: "under review" },
  ]);
}
