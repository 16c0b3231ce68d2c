import { useId, useState } from "react";
import { withNewStage } from "#lib/client/voice/stageEdits.ts";
import type { Library } from "#lib/client/voice/useLibrary.ts";
import type { VoiceDocument } from "#lib/client/voice/useVoiceDocument.ts";
import type { WorkingCopyDocument } from "#lib/client/workingCopy.ts";

interface ChainToolbarProps {
  kept: VoiceDocument;
  library: Library | undefined;
  onAct: (edit: (document: WorkingCopyDocument) => WorkingCopyDocument, done: string) => void;
  onAdded: (id: string) => void;
}

/** Adds stages, and takes steps back. */
export function ChainToolbar({ kept, library, onAct, onAdded }: ChainToolbarProps) {
  const id = useId();
  const [wanted, setWanted] = useState("");
  const add = () => {
    const [kindId = "", topologyId = ""] = wanted.split(" ");
    const found = library?.find(kindId, topologyId);
    if (!found) return document.getElementById(id)?.focus();
    // Made here, so that the same stage comes out when the change is made again over a newer copy.
    const next = withNewStage(kept.document, found);
    const stage = next.stages.at(-1)!;
    onAct((now) => ({ ...now, stages: [...now.stages, stage] }), `${stage.name} was added, with its usual values.`);
    onAdded(stage.id);
  };
  return (
    <div className="chain-tools needs-js">
      <span className="field">
        <label htmlFor={id}>Add a stage with usual values</label>
        <select id={id} className="input" value={wanted} onChange={(event) => setWanted(event.target.value)}>
          <option value="">Choose what</option>
          {library?.kinds.map((kind) => (
            <optgroup key={kind.id} label={kind.name}>
              {kind.topologies.map((topology) => (
                <option key={topology.id} value={`${kind.id} ${topology.id}`}>
                  {topology.name}
                </option>
              ))}
            </optgroup>
          ))}
        </select>
      </span>
      <button type="button" className="btn" aria-disabled={wanted === ""} onClick={add}>
        Add
      </button>
      <span className="ml-auto flex gap-2">
        <button type="button" className="btn" aria-disabled={!kept.canUndo} onClick={() => kept.canUndo && kept.undo()}>
          Undo
        </button>
        <button type="button" className="btn" aria-disabled={!kept.canRedo} onClick={() => kept.canRedo && kept.redo()}>
          Redo
        </button>
      </span>
    </div>
  );
}
