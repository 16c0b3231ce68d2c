import { designate, findIn } from "#lib/circuit/voice/index.ts";
import { changeWorkingCopy, type SaveOutcome, type WorkingCopy } from "./workingCopy.ts";

/** Gives designators over a whole voice and saves it; with `renumber`, all begin again at one. */
export async function designateVoice(voiceId: string, copy: WorkingCopy, renumber: boolean): Promise<SaveOutcome> {
  // Every kind is needed for this, and for little else: it comes when it is asked for.
  const { stageKinds } = await import("#lib/circuit/kinds/index.ts");
  return changeWorkingCopy(voiceId, copy, (document) => ({
    ...document,
    stages: designate(document.stages, findIn(stageKinds), { renumber }) as typeof document.stages,
  }));
}
