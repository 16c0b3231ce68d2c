import type { StageSave } from "#lib/client/useStageSave.ts";
import type { StoredStage } from "#lib/client/workingCopy.ts";

interface SaveLineProps {
  voiceId: string;
  stage: StoredStage;
  saving: StageSave;
  /** Why saving is not offered, for a role that only reads. */
  readOnly?: string | undefined;
}

const words = {
  untouched: "As it stands in the working copy",
  unsaved: "Changes not saved yet",
  saving: "Saving…",
  saved: "Saved in the working copy",
} as const;

/** Saves the stage and says how that went, beside the work and for as long as it matters. */
export function SaveLine({ voiceId, stage, saving, readOnly }: SaveLineProps) {
  const { state, save, saveOverNewer } = saving;
  if (readOnly !== undefined) return <p className="note">{readOnly}</p>;
  const signIn = `/sign-in?next=${encodeURIComponent(`/voices/${voiceId}`)}`;
  return (
    <div>
      <p className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <button
          type="button"
          className="btn btn-primary"
          aria-disabled={state.kind === "saving"}
          onClick={() => state.kind !== "saving" && void save(stage)}
        >
          Save stage
        </button>
        <span className="text-small text-ink-2" role="status">
          {state.kind in words ? words[state.kind as keyof typeof words] : "Not saved"}
        </span>
      </p>
      <div role="alert">
        {state.kind === "conflict" && (
          <div className="caution mt-3">
            <strong>Someone saved a newer copy of this voice.</strong> Your values are still here.{" "}
            {state.current === null
              ? "The newer copy could not be read; try again in a moment."
              : "Put this stage into the newer copy, which leaves its other stages as they are, or look at the newer copy first."}
            <span className="mt-2 flex flex-wrap gap-x-4 gap-y-2">
              {state.current !== null && (
                <button type="button" className="btn" onClick={() => void saveOverNewer(stage)}>
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
