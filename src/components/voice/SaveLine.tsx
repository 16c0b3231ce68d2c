import { useId } from "react";
import type { StageSave } from "#lib/client/useStageSave.ts";
import type { StoredStage } from "#lib/client/workingCopy.ts";
import { longestStageName } from "#lib/wire/stageName.ts";

interface SaveLineProps {
  voiceId: string;
  saving: StageSave;
  /** The stage as it would be saved, or null where a field says why it cannot be. */
  savable: () => StoredStage | null;
  onTurnBack: () => void;
  name: string;
  nameFault: string | undefined;
  onName: (name: string) => void;
}

const words = {
  untouched: "As it stands in the working copy",
  unsaved: "Changes not saved yet",
  saving: "Saving…",
  saved: "Saved in the working copy",
} as const;

/** Names and saves the stage, and says how that went, beside the work and for as long as it matters. */
export function SaveLine({ voiceId, saving, savable, onTurnBack, name, nameFault, onName }: SaveLineProps) {
  const { state, save, saveOverNewer } = saving;
  const id = useId();
  const signIn = `/sign-in?next=${encodeURIComponent(`/voices/${voiceId}`)}`;
  const busy = state.kind === "saving";
  const changed = state.kind !== "untouched" && state.kind !== "saved" && !busy;
  const send = (by: (stage: StoredStage) => Promise<void>) => {
    const stage = busy ? null : savable();
    if (stage !== null) void by(stage);
  };
  return (
    <div>
      <div className="save-row">
        <span className="field">
          <label htmlFor={`${id}-name`}>Name of the stage</label>
          <input
            id={`${id}-name`}
            className="input stage-name"
            value={name}
            maxLength={longestStageName}
            autoComplete="off"
            aria-invalid={nameFault !== undefined || undefined}
            aria-describedby={`${id}-note`}
            onChange={(event) => onName(event.target.value)}
          />
        </span>
        <button type="button" className="btn btn-primary" aria-disabled={busy} onClick={() => send(save)}>
          Save stage
        </button>
        <button
          type="button"
          className="btn"
          aria-disabled={!changed}
          onClick={() => {
            if (changed) onTurnBack();
          }}
        >
          Back to the saved values
        </button>
      </div>
      <p id={`${id}-note`} className={nameFault === undefined ? "field-note" : "field-note error"} role="status">
        {nameFault ?? (state.kind in words ? words[state.kind as keyof typeof words] : "Not saved")}
      </p>
      <div role="alert">
        {state.kind === "conflict" && (
          <div className="caution mt-3">
            <strong>Someone saved a newer copy of this voice.</strong> Your values are still here.{" "}
            {state.current === null
              ? "The newer copy could not be read; try again in a moment."
              : "Put this stage into the newer copy, which leaves its other stages as they are; or look at the newer copy first; or give up your values for its."}
            <span className="mt-2 flex flex-wrap gap-x-4 gap-y-2">
              {state.current !== null && (
                <button type="button" className="btn" onClick={() => send(saveOverNewer)}>
                  Put this stage into the newer copy
                </button>
              )}
              <a className="btn" href={`/voices/${voiceId}`} target="_blank" rel="noreferrer">
                Look at it in a new tab
              </a>
            </span>
          </div>
        )}
        {state.kind === "signed-out" && (
          <p className="caution mt-3">
            <strong>Your sign-in has expired.</strong> Nothing typed is lost:{" "}
            <a href={signIn} target="_blank" rel="noreferrer">
              sign in in a new tab
            </a>
            , come back here and save again.
          </p>
        )}
        {state.kind === "unreachable" && (
          <p className="caution mt-3">
            <strong>The server could not be reached.</strong> Your values stay on this page: check the connection and
            save again.
          </p>
        )}
        {state.kind === "refused" && (
          <div className="fault mt-3">
            <strong>Not saved.</strong> {state.detail} Your values stay here.
            {state.errors.length > 0 && (
              <ul className="mt-1">
                {state.errors.map(({ path, message }) => (
                  <li key={path}>
                    <span className="val">{path}</span> {message}
                  </li>
                ))}
              </ul>
            )}
          </div>
        )}
      </div>
    </div>
  );
}
