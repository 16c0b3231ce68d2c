import { useCallback, useEffect, useState } from "react";
import { saveWorkingCopy, withStage, type SaveOutcome, type StoredStage, type WorkingCopy } from "./workingCopy.ts";

export type SaveState = { kind: "untouched" } | { kind: "unsaved" } | { kind: "saving" } | SaveOutcome;

export interface StageSave {
  state: SaveState;
  /** The newest saved copy there is word of. */
  newest: WorkingCopy;
  /** Call on every change by hand, so that leaving the page asks first. */
  touch: () => void;
  save: (stage: StoredStage) => Promise<void>;
  /** After a conflict: puts this stage into the newer copy and leaves everything else of it as it is. */
  saveOverNewer: (stage: StoredStage) => Promise<void>;
  /** Gives up what is not saved; answers with the copy to show instead. */
  turnBack: () => WorkingCopy;
}

/** Keeps one stage of a voice: what is on screen is never replaced, however a save ends. */
export function useStageSave(voiceId: string, start: WorkingCopy): StageSave {
  const [copy, setCopy] = useState(start);
  const [state, setState] = useState<SaveState>({ kind: "untouched" });

  const send = useCallback(
    async (base: WorkingCopy, stage: StoredStage) => {
      setState({ kind: "saving" });
      const outcome = await saveWorkingCopy(voiceId, { etag: base.etag, document: withStage(base.document, stage) });
      if (outcome.kind === "saved") setCopy(outcome.copy);
      // Edits made while the save was under way stay unsaved.
      setState((now) => (now.kind === "unsaved" && outcome.kind === "saved" ? now : outcome));
    },
    [voiceId],
  );

  const touch = useCallback(() => {
    setState((now) => (now.kind === "conflict" ? now : { kind: "unsaved" }));
  }, []);
  const save = useCallback((stage: StoredStage) => send(copy, stage), [copy, send]);
  const saveOverNewer = useCallback(
    async (stage: StoredStage) => {
      if (state.kind === "conflict" && state.current !== null) await send(state.current, stage);
    },
    [send, state],
  );

  const newest = state.kind === "conflict" && state.current !== null ? state.current : copy;
  const turnBack = useCallback(() => {
    setCopy(newest);
    setState({ kind: "untouched" });
    return newest;
  }, [newest]);

  const atRisk = state.kind !== "untouched" && state.kind !== "saved";
  useEffect(() => {
    if (!atRisk) return undefined;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [atRisk]);

  return { state, newest, touch, save, saveOverNewer, turnBack };
}
