import { useState, type SyntheticEvent } from "react";
import { longestStageName, stageNameFault } from "#lib/wire/stageName.ts";
import { Confirmed } from "./Confirmed.tsx";

interface StageRowActionsProps {
  id: string;
  name: string;
  isFirst: boolean;
  isLast: boolean;
  busy: boolean;
  onMove: (by: -1 | 1) => void;
  onRename: (name: string) => Promise<boolean>;
  onRemove: () => void;
}

/** What can be done with one stage of the list. */
export function StageRowActions({ id, name, isFirst, isLast, busy, ...act }: StageRowActionsProps) {
  const [renaming, setRenaming] = useState(false);
  if (renaming) {
    return <RenameStage id={id} name={name} busy={busy} onRename={act.onRename} onClose={() => setRenaming(false)} />;
  }
  return (
    <div className="row-actions" role="group" aria-label={`Change ${name}`}>
      {(["up", "down"] as const).map((way) => {
        const still = busy || (way === "up" ? isFirst : isLast);
        return (
          <button
            key={way}
            type="button"
            id={`${id}-${way}`}
            className="btn-text"
            aria-disabled={still}
            onClick={() => {
              if (!still) act.onMove(way === "up" ? -1 : 1);
            }}
          >
            {way === "up" ? "Move up" : "Move down"}
          </button>
        );
      })}
      <button type="button" className="btn-text" onClick={() => setRenaming(true)}>
        Rename
      </button>
      <Confirmed
        label="Remove"
        warning={
          <>
            <strong className="wrap-anywhere">{name}</strong> leaves this voice with its values and designators.
          </>
        }
        confirmLabel="Remove it"
        keepLabel="Keep it"
        busy={busy}
        onConfirm={act.onRemove}
      />
    </div>
  );
}

interface RenameStageProps {
  id: string;
  name: string;
  busy: boolean;
  onRename: (name: string) => Promise<boolean>;
  onClose: () => void;
}

function RenameStage({ id, name, busy, onRename, onClose }: RenameStageProps) {
  const [text, setText] = useState(name);
  const [fault, setFault] = useState<string>();
  const send = async (event: SyntheticEvent) => {
    event.preventDefault();
    const found = stageNameFault(text);
    setFault(found);
    if (found === undefined && !busy && (await onRename(text.trim()))) onClose();
  };
  return (
    <form className="field" noValidate onSubmit={(event) => void send(event)}>
      <label htmlFor={`${id}-name`}>Name of the stage</label>
      <div className="flex flex-wrap gap-2">
        <input
          id={`${id}-name`}
          className="input min-w-0 flex-1"
          value={text}
          maxLength={longestStageName}
          autoComplete="off"
          autoFocus
          aria-invalid={fault !== undefined || undefined}
          aria-describedby={`${id}-name-note`}
          onChange={(event) => setText(event.target.value)}
        />
        <button type="submit" className="btn" aria-disabled={busy}>
          Rename
        </button>
        <button type="button" className="btn" onClick={onClose}>
          Leave it
        </button>
      </div>
      <p id={`${id}-name-note`} className={fault === undefined ? "field-note" : "field-note error"}>
        {fault}
      </p>
    </form>
  );
}
