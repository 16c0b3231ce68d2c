import { useEffect, useId, useState, type SyntheticEvent } from "react";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { failureText, request } from "#lib/client/request.ts";
import { appendStage } from "#lib/client/stage/appendStage.ts";
import type { StoredStage } from "#lib/client/workingCopy.ts";
import { longestStageName, stageNameFault } from "#lib/wire/stageName.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import type { StageState } from "#lib/wire/stageState.ts";

interface SaveToVoiceProps {
  kind: KindBrief;
  topology: AnyTopology;
  state: StageState;
  /** The voice that was left to add this stage. */
  meant?: VoiceChoice | undefined;
}

export interface VoiceChoice {
  id: string;
  name: string;
  can?: { editWorkingCopy?: boolean };
}

type Saving =
  | { kind: "idle" }
  | { kind: "saving" }
  | { kind: "saved"; voice: VoiceChoice; stage: StoredStage }
  | { kind: "failed"; message: string };

/** Puts the stage into the working copy of a voice, with the voice's next free designators. */
export function SaveToVoice({ kind, topology, state, meant }: SaveToVoiceProps) {
  const id = useId();
  const [voices, setVoices] = useState<VoiceChoice[] | string | null>(null);
  const [chosen, setChosen] = useState(meant?.id ?? "");
  const [name, setName] = useState(kind.name);
  const [saving, setSaving] = useState<Saving>({ kind: "idle" });

  useEffect(() => {
    let left = false;
    const load = async () => {
      const answer = await request<{ voices: VoiceChoice[] }>("/api/voices?limit=200&sort=name");
      if (left) return;
      if (answer.kind !== "done") return setVoices(failureText(answer));
      const listed = answer.body.voices.filter((voice) => voice.can?.editWorkingCopy !== false);
      const isListed = listed.some((voice) => voice.id === meant?.id);
      setVoices(meant && !isListed ? [meant, ...listed] : listed);
    };
    void load();
    return () => {
      left = true;
    };
  }, [meant]);

  const voice = Array.isArray(voices) ? (voices.find((v) => v.id === chosen) ?? voices[0]) : undefined;
  const save = async (event: SyntheticEvent) => {
    event.preventDefault();
    if (!voice || saving.kind === "saving") return;
    const fault = stageNameFault(name);
    if (fault !== undefined) return setSaving({ kind: "failed", message: fault });
    setSaving({ kind: "saving" });
    const outcome = await appendStage(voice.id, { kind, topology, state, name: name.trim() });
    setSaving(
      outcome.kind === "saved"
        ? { kind: "saved", voice, stage: outcome.stage }
        : { kind: "failed", message: outcome.message },
    );
  };

  return (
    <form className="save-panel" aria-label="Save to a voice" onSubmit={(event) => void save(event)}>
      {voices === null && <p role="status">Looking up the team’s voices…</p>}
      {typeof voices === "string" && (
        <p className="fault" role="alert">
          {voices}
        </p>
      )}
      {Array.isArray(voices) && voices.length === 0 && (
        <p>
          No voice that you may edit yet. <a href="/voices">Create one</a> in another tab, then open this again; the
          values stay in this page’s address.
        </p>
      )}
      {voice && Array.isArray(voices) && (
        <div className="save-row">
          <span className="field">
            <label htmlFor={`${id}-voice`}>Voice</label>
            <select id={`${id}-voice`} className="input" value={voice.id} onChange={(e) => setChosen(e.target.value)}>
              {voices.map((v) => (
                <option key={v.id} value={v.id}>
                  {v.name}
                </option>
              ))}
            </select>
          </span>
          <span className="field">
            <label htmlFor={`${id}-name`}>Name of the stage</label>
            <input
              id={`${id}-name`}
              className="input"
              value={name}
              maxLength={longestStageName}
              autoComplete="off"
              onChange={(e) => setName(e.target.value)}
            />
          </span>
          <button type="submit" className="btn btn-primary" aria-disabled={saving.kind === "saving"}>
            {saving.kind === "saving" ? "Saving…" : "Save stage"}
          </button>
        </div>
      )}
      <div aria-live="polite">
        {saving.kind === "saved" && (
          <p className="done wrap-anywhere">
            <strong>Saved.</strong> {saving.stage.name} stands in {saving.voice.name}
            {/* A network without parts of its own has none to name. */}
            {Object.keys(saving.stage.designators).length > 0 && (
              <>
                {" "}
                as <span className="val">{Object.values(saving.stage.designators).join(" ")}</span>
              </>
            )}
            . <a href={`/voices/${saving.voice.id}/stages/${saving.stage.id}`}>Open it there</a>, or go back to{" "}
            <a href={`/voices/${saving.voice.id}`}>all stages of {saving.voice.name}</a>.
          </p>
        )}
        {saving.kind === "failed" && (
          <p className="fault">
            <strong>Not saved.</strong> {saving.message}
          </p>
        )}
      </div>
    </form>
  );
}
