import type { Acceptance } from "#lib/circuit/voice/index.ts";
import type { Stage } from "#lib/wire/stage.ts";
import { request, type Fault } from "./request.ts";

export type StoredStage = Stage;

export interface StoredLink {
  id: string;
  from: { stage: string; port: string };
  to: { stage: string; port: string };
}

export interface WorkingCopyDocument {
  format: 1;
  stages: StoredStage[];
  links: StoredLink[];
  conditions: Record<string, number | string>;
  accepted?: Acceptance[] | undefined;
}

export interface WorkingCopy {
  etag: string;
  document: WorkingCopyDocument;
}

/** How a save can end. Whatever it is, the entries on screen stay; only `saved` and `conflict` bring a newer copy. */
export type SaveOutcome =
  | { kind: "saved"; copy: WorkingCopy }
  | { kind: "conflict"; current: WorkingCopy | null }
  | { kind: "signed-out" }
  | { kind: "unreachable" }
  | { kind: "refused"; detail: string; errors: Fault[] };

const pathOf = (voiceId: string) => `/api/voices/${encodeURIComponent(voiceId)}/working-copy`;

/** Null where it could not be read, for whatever reason. */
export async function readWorkingCopy(voiceId: string): Promise<WorkingCopy | null> {
  const answer = await request<WorkingCopyDocument>(pathOf(voiceId));
  return answer.kind === "done" && answer.etag !== null ? { etag: answer.etag, document: answer.body } : null;
}

/** The newer copy that the server sends along when it refuses a stale one. */
function copyIn(current: unknown, etag: string | null): WorkingCopy | null {
  const carried = typeof current === "object" && current !== null && "stages" in current && etag !== null;
  return carried ? { etag, document: current as WorkingCopyDocument } : null;
}

export async function saveWorkingCopy(voiceId: string, { etag, document }: WorkingCopy): Promise<SaveOutcome> {
  const answer = await request<WorkingCopyDocument>(pathOf(voiceId), { method: "PUT", body: document, ifMatch: etag });
  switch (answer.kind) {
    case "done":
      return { kind: "saved", copy: { etag: answer.etag ?? etag, document: answer.body } };
    case "refused":
      if (answer.status === 412) return { kind: "conflict", current: copyIn(answer.problem.current, answer.etag) };
      return { kind: "refused", detail: answer.detail, errors: answer.errors };
    case "signed-out":
    case "unreachable":
      return answer;
  }
}

/** The document with this stage in place of its older self, or at the end if it is new. */
export function withStage(document: WorkingCopyDocument, stage: StoredStage): WorkingCopyDocument {
  const known = document.stages.some(({ id }) => id === stage.id);
  const stages = known
    ? document.stages.map((old) => (old.id === stage.id ? stage : old))
    : [...document.stages, stage];
  return { ...document, stages };
}

/** The document without the stage, and without the links that led to or from it. */
export function withoutStage(document: WorkingCopyDocument, stageId: string): WorkingCopyDocument {
  return {
    ...document,
    stages: document.stages.filter(({ id }) => id !== stageId),
    links: document.links.filter(({ from, to }) => from.stage !== stageId && to.stage !== stageId),
  };
}

/** Changes the newest copy there is: used where the change is the same whatever else was saved meanwhile. */
export async function changeWorkingCopy(
  voiceId: string,
  start: WorkingCopy,
  change: (document: WorkingCopyDocument) => WorkingCopyDocument,
): Promise<SaveOutcome> {
  let copy = start;
  for (let tries = 0; tries < 3; tries += 1) {
    const outcome = await saveWorkingCopy(voiceId, { etag: copy.etag, document: change(copy.document) });
    if (outcome.kind !== "conflict" || outcome.current === null) return outcome;
    copy = outcome.current;
  }
  return { kind: "conflict", current: copy };
}
