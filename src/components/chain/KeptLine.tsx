import { useState } from "react";
import type { Choice } from "#lib/client/voice/mergeDocuments.ts";
import type { KeptState, VoiceDocument } from "#lib/client/voice/useVoiceDocument.ts";

function stateText(state: KeptState): string {
  switch (state.kind) {
    case "saved":
      return state.joined
        ? "All changes are saved. Somebody else saved this voice meanwhile; what they changed is in here."
        : "All changes are saved.";
    case "saving":
      return "Saving…";
    case "waiting":
      return "The server cannot be reached. Your changes wait on this page and are saved as soon as it answers.";
    case "signed-out":
      return "Your sign-in has expired, so nothing is saved for now.";
    case "refused":
      return "Not saved.";
    case "clash":
      return "Not saved: somebody else changed the same stage.";
  }
}

interface KeptLineProps {
  voiceId: string;
  kept: VoiceDocument;
  /** What the last change did. */
  said: string;
}

/** How the voice is kept, said all the time, and what to do where it is not. */
export function KeptLine({ voiceId, kept, said }: KeptLineProps) {
  const { state } = kept;
  return (
    <div className="chain-kept">
      <p role="status" className="text-small text-ink-2">
        {said} {stateText(state)}
      </p>
      <div role="alert">
        {state.kind === "signed-out" && (
          <p className="caution mt-2">
            <strong>Nothing is lost.</strong>{" "}
            <a href={`/sign-in?next=${encodeURIComponent(`/voices/${voiceId}`)}`} target="_blank" rel="noreferrer">
              Sign in in a new tab
            </a>
            , then come back and{" "}
            <button type="button" className="btn-text" onClick={kept.retry}>
              save again
            </button>
            .
          </p>
        )}
        {state.kind === "refused" && (
          <div className="fault mt-2">
            <strong>The server refused this state.</strong> {state.outcome.detail} Your changes stay on this page: mend
            them, or undo.
            <ul className="mt-1">
              {state.outcome.errors.map(({ path, message }) => (
                <li key={path}>
                  <span className="val">{path}</span> {message}
                </li>
              ))}
            </ul>
          </div>
        )}
        {state.kind === "clash" && <Clashes key={state.current.etag} clashes={state.clashes} onSettle={kept.settle} />}
      </div>
    </div>
  );
}

interface ClashesProps {
  clashes: Extract<KeptState, { kind: "clash" }>["clashes"];
  onSettle: (choices: Record<string, Choice>) => void;
}

/** Each place that both changed, one line, to be chosen one by one. */
function Clashes({ clashes, onSettle }: ClashesProps) {
  const [choices, setChoices] = useState<Record<string, Choice>>({});
  const open = clashes.filter(({ id }) => !(id in choices)).length;
  const word = (side: Choice, what: "changed" | "removed") =>
    `${side === "mine" ? "Mine" : "Theirs"}${what === "removed" ? ": removed" : ""}`;
  return (
    <div className="caution mt-2">
      <strong>You and somebody else changed the same place.</strong> Everything else is brought together. Choose whose
      stands; nothing is saved before.
      {clashes.map((clash) => (
        <fieldset key={clash.id} className="mt-2 flex flex-wrap gap-x-4">
          <legend className="wrap-anywhere font-semibold">{clash.name}</legend>
          {(["mine", "theirs"] as const).map((side) => (
            <label key={side} className="flex items-center gap-2">
              <input
                type="radio"
                name={`clash-${clash.id}`}
                checked={choices[clash.id] === side}
                onChange={() => setChoices({ ...choices, [clash.id]: side })}
              />
              {word(side, clash[side])}
            </label>
          ))}
        </fieldset>
      ))}
      <button
        type="button"
        className="btn mt-2"
        aria-disabled={open > 0}
        onClick={() => {
          if (open === 0) onSettle(choices);
        }}
      >
        Bring them together and save
      </button>
    </div>
  );
}
