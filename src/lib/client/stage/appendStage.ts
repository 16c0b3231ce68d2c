import type { AnyTopology } from "#lib/circuit/index.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { failureText, request } from "../request.ts";
import { changeWorkingCopy, withStage, type StoredStage, type WorkingCopyDocument } from "../workingCopy.ts";
import { assignDesignators } from "./designators.ts";
import { newStageId } from "./newStageId.ts";

interface NewStage {
  kind: KindBrief;
  topology: AnyTopology;
  state: StageState;
  name: string;
}

export type Appended = { kind: "saved"; stage: StoredStage } | { kind: "failed"; message: string };

/** Puts a stage at the end of a voice's working copy, with the next designators that are free there. */
export async function appendStage(voiceId: string, { kind, topology, state, name }: NewStage): Promise<Appended> {
  const copy = await request<WorkingCopyDocument>(`/api/voices/${encodeURIComponent(voiceId)}/working-copy`);
  if (copy.kind !== "done") return { kind: "failed", message: failureText(copy) };
  const id = newStageId();
  const stageIn = (document: WorkingCopyDocument): StoredStage => ({
    id,
    kind: kind.id,
    topology: topology.id,
    name,
    parts: state.parts,
    conditions: state.conditions,
    targets: state.targets,
    ...(Object.keys(state.windows).length > 0 && { windows: state.windows }),
    designators: assignDesignators(
      topology,
      state.parts,
      {},
      document.stages.flatMap(({ designators }) => Object.values(designators)),
    ),
  });
  let stage = stageIn(copy.body);
  const outcome = await changeWorkingCopy(voiceId, { etag: copy.etag ?? "", document: copy.body }, (document) => {
    // Another save in between may have taken the numbers.
    stage = stageIn(document);
    return withStage(document, stage);
  });
  switch (outcome.kind) {
    case "saved":
      return { kind: "saved", stage };
    case "conflict":
      return {
        kind: "failed",
        message: "Others are saving this voice just now. Your values stay here: try again in a moment.",
      };
    case "signed-out":
    case "unreachable":
      return { kind: "failed", message: failureText(outcome) };
    case "refused": {
      const faults = outcome.errors.map(({ message }) => message);
      return { kind: "failed", message: `${[outcome.detail, ...faults].join(" ")} Your values stay here.` };
    }
  }
}
