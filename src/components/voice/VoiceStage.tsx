import { useState } from "react";
import { completeConditions, defaultParts, defaultTargets } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { assignDesignators } from "#lib/client/stage/designators.ts";
import { useStageSave } from "#lib/client/useStageSave.ts";
import type { StoredStage, WorkingCopy } from "#lib/client/workingCopy.ts";
import { usualSeries, type StageState } from "#lib/wire/stageState.ts";
import { StageSheet } from "../sheet/StageSheet.tsx";
import { topologyOf } from "../sheet/useStage.ts";
import { SaveLine } from "./SaveLine.tsx";

interface VoiceStageProps {
  voiceId: string;
  stageId: string;
  copy: WorkingCopy;
  /** Why saving is not offered, for a role that only reads. */
  readOnly?: string | undefined;
}

/** A stage of a voice on its sheet, kept in the voice's working copy. */
export function VoiceStage({ voiceId, stageId, copy, readOnly }: VoiceStageProps) {
  const stored = copy.document.stages.find(({ id }) => id === stageId)!;
  const kind = stageKinds.find(({ id }) => id === stored.kind)!;
  const saving = useStageSave(voiceId, copy);
  const [start] = useState(() => sheetState(stored));
  const [state, setState] = useState(start);

  const taken = copy.document.stages.flatMap(({ id, designators }) =>
    id === stageId ? [] : Object.values(designators),
  );
  const { parts, conditions, targets, windows } = state;
  const designators = assignDesignators(topologyOf(kind, state.topology), parts, stored.designators, taken);
  const stage: StoredStage = { ...stored, topology: state.topology, parts, conditions, targets, windows, designators };

  const take = (next: StageState) => {
    setState(next);
    saving.touch();
  };

  return (
    <StageSheet
      kind={stored.kind}
      initial={start}
      onChange={take}
      designators={designators}
      readOnly={readOnly !== undefined}
      name={stored.name}
    >
      <div className="border-b border-rule px-4 py-3 narrow:px-6">
        <SaveLine voiceId={voiceId} stage={stage} saving={saving} readOnly={readOnly} />
      </div>
    </StageSheet>
  );
}

/** What a document leaves out stands at its default. */
function sheetState(stored: StoredStage): StageState {
  const topology = topologyOf(
    stageKinds.find(({ id }) => id === stored.kind)!,
    stored.topology,
  );
  return {
    topology: topology.id,
    targets: { ...defaultTargets(topology), ...stored.targets },
    windows: stored.windows ?? {},
    parts: { ...defaultParts(topology), ...stored.parts },
    conditions: completeConditions(topology, stored.conditions),
    series: usualSeries,
  };
}
