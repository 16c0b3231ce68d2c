import type { Database } from "#lib/db/index.ts";
import { askForReview } from "#lib/server/revisions/askForReview.ts";
import { decideReview } from "#lib/server/revisions/decide.ts";
import { makeRevision } from "#lib/server/revisions/make.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { saveWorkingCopy } from "#lib/server/workingCopies/save.ts";
import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { makeTeam, type TestTeam } from "./people.ts";
import { bandPassStage, emptyDocument } from "./stages.ts";

export interface TestVoice {
  team: TestTeam;
  id: string;
  /** Puts a band-pass with this resistance to ground into the working copy. */
  save(rb: number): Promise<void>;
  /** A revision of the working copy by the designer; its number. */
  make(reason?: string): Promise<number>;
  ask(number: number): Promise<void>;
  release(number: number): Promise<void>;
}

/** A voice of a team of its own, with what a designer and a reviewer do to it. */
export async function makeVoice(db: Database, given?: TestTeam): Promise<TestVoice> {
  const team = given ?? (await makeTeam(db));
  const designer = await team.as("designer");
  const { id } = await createVoice({ ctx: designer, input: { name: "Rattle", template: "empty" } });
  let version = 1;
  const ask = async (number: number) => {
    await askForReview({ ctx: designer, input: { id, number } });
  };
  return {
    team,
    id,
    async save(rb) {
      const stage = bandPassStage("band", { ra: "R1", rb: "R2", rf: "R3", c1: "C1", c2: "C2" });
      const stages = [{ ...stage, parts: { ...stage.parts, rb } }];
      const document = workingCopyDocument.parse({ ...emptyDocument, stages });
      await saveWorkingCopy({ ctx: designer, input: { id, document, expected: [version] } });
      version += 1;
    },
    async make(reason = "first try") {
      const input = { id, reason, acceptedWarnings: [], expected: null };
      return (await makeRevision({ ctx: designer, input })).number;
    },
    ask,
    async release(number) {
      await ask(number);
      const ctx = await team.as("reviewer");
      await decideReview({ ctx, input: { id, number, decision: "release", note: "" } });
    },
  };
}
