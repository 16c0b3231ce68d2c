import { analyseStages, libraryVersion } from "#lib/circuit/index.ts";
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

/** The document as it was before its latest change: the same targets met with the next lower resistor. */
function earlier(document: WorkingCopyDocument): WorkingCopyDocument {
  const [first, ...rest] = document.stages;
  const [part, value] = Object.entries(first?.parts ?? {}).find(([, ohms]) => ohms > 100 && ohms < 10_000) ?? [];
  if (!first || part === undefined || value === undefined) return document;
  return { ...document, stages: [{ ...first, parts: { ...first.parts, [part]: value * 0.9 } }, ...rest] };
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
