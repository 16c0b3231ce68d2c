import { useEffect, useId, useState, type FormEvent } from "react";
import type { AnyTopology, StageKind } from "#lib/circuit/index.ts";
import { failureText, request } from "#lib/client/request.ts";
import { assignDesignators } from "#lib/client/stage/designators.ts";
import { changeWorkingCopy, readWorkingCopy, withStage, type StoredStage } from "#lib/client/workingCopy.ts";
import type { StageState } from "#lib/wire/stageState.ts";

interface SaveToVoiceProps {
  kind: StageKind;
  topology: AnyTopology;
  state: StageState;
}

interface VoiceChoice {
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
export function SaveToVoice({ kind, topology, state }: SaveToVoiceProps) {
  const id = useId();
  const [voices, setVoices] = useState<VoiceChoice[] | string | null>(null);
  const [chosen, setChosen] = useState("");
  const [name, setName] = useState(kind.name);
  const [saving, setSaving] = useState<Saving>({ kind: "idle" });

  useEffect(() => {
    let left = false;
    const load = async () => {
      const answer = await request<{ voices: VoiceChoice[] }>("/api/voices?limit=200&sort=name");
      if (left) return;
      setVoices(
        answer.kind === "done"
          ? answer.body.voices.filter((voice) => voice.can?.editWorkingCopy !== false)
          : failureText(answer),
      );
    };
    void load();
    return () => {
      left = true;
    };
  }, []);

  const voice = Array.isArray(voices) ? (voices.find((v) => v.id === chosen) ?? voices[0]) : undefined;
  const save = async (event: FormEvent) => {
    event.preventDefault();
    if (!voice || saving.kind === "saving") return;
    if (name.trim() === "") return setSaving({ kind: "failed", message: "Give the stage a name, such as Body or Snap." });
    setSaving({ kind: "saving" });
    setSaving(await append(voice, { kind, topology, state }, name.trim()));
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
              maxLength={120}
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
          <p className="done">
            <strong>Saved.</strong> {saving.stage.name} stands in {saving.voice.name} as{" "}
            <span className="val">{Object.values(saving.stage.designators).join(" ")}</span>.{" "}
            <a href={`/voices/${saving.voice.id}/stages/${saving.stage.id}`}>Open it there</a>
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

async function append(
  voice: VoiceChoice,
  { kind, topology, state }: SaveToVoiceProps,
  name: string,
): Promise<Saving> {
  const copy = await readWorkingCopy(voice.id);
  if (copy === null) {
    return {
      kind: "failed",
      message: "The voice could not be read. Your values stay on this page: check that you are signed in, then try again.",
    };
  }
  const id = newId();
  let stage: StoredStage | undefined;
  const outcome = await changeWorkingCopy(voice.id, copy, (document) => {
    const taken = document.stages.flatMap(({ designators }) => Object.values(designators));
    stage = {
      id,
      kind: kind.id,
      topology: topology.id,
      name,
      parts: state.parts,
      conditions: state.conditions,
      targets: state.targets,
      ...(Object.keys(state.windows).length > 0 && { windows: state.windows }),
      designators: assignDesignators(topology, state.parts, {}, taken),
    };
    return withStage(document, stage);
  });
  switch (outcome.kind) {
    case "saved":
      return { kind: "saved", voice, stage: stage! };
    case "conflict":
      return { kind: "failed", message: "Others are saving this voice just now. Your values stay here: try again in a moment." };
    case "signed-out":
    case "unreachable":
      return { kind: "failed", message: failureText(outcome) };
    case "refused":
      return { kind: "failed", message: `${[outcome.detail, ...outcome.errors.map(({ message }) => message)].join(" ")} Your values stay here.` };
  }
}

/** Unlike randomUUID, this also works where the page is not served over TLS. */
function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(12));
  return `s-${[...bytes].map((byte) => byte.toString(16).padStart(2, "0")).join("")}`;
}
