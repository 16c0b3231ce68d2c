import { useCallback, useEffect, useRef, useState } from "react";
import { saveWorkingCopy, type SaveOutcome, type WorkingCopy, type WorkingCopyDocument } from "../workingCopy.ts";
import { begin, redo, step, undo, type History } from "./history.ts";
import { mergeDocuments, type Choice, type Clash } from "./mergeDocuments.ts";

export type KeptState =
  | { kind: "saved"; joined: boolean }
  | { kind: "saving" }
  | { kind: "waiting" }
  | { kind: "signed-out" }
  | { kind: "refused"; outcome: Extract<SaveOutcome, { kind: "refused" }> }
  | { kind: "clash"; current: WorkingCopy; clashes: Clash[] };

export interface VoiceDocument {
  document: WorkingCopyDocument;
  state: KeptState;
  change: (edit: (document: WorkingCopyDocument) => WorkingCopyDocument) => void;
  undo: () => void;
  redo: () => void;
  canUndo: boolean;
  canRedo: boolean;
  /** Tries again to save what waits. */
  retry: () => void;
  /** After a clash: whose version of each place stands. */
  settle: (choices: Record<string, Choice>) => void;
}

/** ms after which a server that could not be reached is asked again. */
const patience = 5000;

/**
 * Keeps a whole voice while it is edited: every change is saved at once, one save at a time, and whatever becomes of a
 * save, what is on screen stays. Changes of others are taken in stage by stage.
 */
export function useVoiceDocument(voiceId: string, start: WorkingCopy): VoiceDocument {
  const [history, setHistory] = useState<History<WorkingCopyDocument>>(() => begin(start.document));
  const [state, setState] = useState<KeptState>({ kind: "saved", joined: false });
  const [turn, setTurn] = useState(0);
  /** What the server has, as far as is known. */
  const saved = useRef(start);
  const busy = useRef(false);
  /** Whether what others did was taken in since the last change made here. */
  const joined = useRef(false);
  const document = history.now;
  const latest = useRef(document);
  useEffect(() => {
    latest.current = document;
  }, [document]);

  const takeIn = useCallback(
    (mine: WorkingCopyDocument, current: WorkingCopy, choices: Record<string, Choice> = {}) => {
      const { document: merged, clashes } = mergeDocuments(saved.current.document, mine, current.document, choices);
      if (clashes.some(({ id }) => !(id in choices))) return setState({ kind: "clash", current, clashes });
      saved.current = current;
      // Taking back a step would take back what others did meanwhile.
      setHistory(begin(merged));
      joined.current = true;
      setState({ kind: "saved", joined: true });
      setTurn((count) => count + 1);
    },
    [],
  );

  useEffect(() => {
    const stopped = state.kind === "clash" || state.kind === "refused";
    if (busy.current || stopped || document === saved.current.document) return;
    busy.current = true;
    const sent = document;
    setState((now) => (now.kind === "waiting" ? now : { kind: "saving" }));
    void saveWorkingCopy(voiceId, { etag: saved.current.etag, document: sent }).then((outcome) => {
      busy.current = false;
      switch (outcome.kind) {
        case "saved":
          // The stages stay the objects they are, so that nothing is computed anew.
          saved.current = { etag: outcome.copy.etag, document: sent };
          setState({ kind: "saved", joined: joined.current });
          break;
        case "conflict":
          if (outcome.current === null) setState({ kind: "waiting" });
          else takeIn(latest.current, outcome.current);
          break;
        case "unreachable":
          setState({ kind: "waiting" });
          break;
        case "signed-out":
          setState({ kind: "signed-out" });
          break;
        case "refused":
          setState({ kind: "refused", outcome });
      }
      if (outcome.kind === "saved") setTurn((count) => count + 1);
    });
  }, [document, state.kind, takeIn, turn, voiceId]);

  const retry = useCallback(() => setTurn((count) => count + 1), []);
  useEffect(() => {
    if (state.kind !== "waiting") return undefined;
    const timer = setInterval(retry, patience);
    window.addEventListener("online", retry);
    return () => {
      clearInterval(timer);
      window.removeEventListener("online", retry);
    };
  }, [state.kind, retry]);

  const atRisk = state.kind !== "saved";
  useEffect(() => {
    if (!atRisk) return undefined;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", ask);
    return () => window.removeEventListener("beforeunload", ask);
  }, [atRisk]);

  /** A change is a new chance for what the server refused. */
  const go = useCallback((next: (history: History<WorkingCopyDocument>) => History<WorkingCopyDocument>) => {
    joined.current = false;
    setHistory(next);
    setState((now) => (now.kind === "refused" || now.kind === "signed-out" ? { kind: "saving" } : now));
  }, []);
  return {
    document,
    state,
    change: useCallback((edit) => go((now) => step(now, edit(now.now))), [go]),
    undo: useCallback(() => go(undo), [go]),
    redo: useCallback(() => go(redo), [go]),
    canUndo: history.past.length > 0,
    canRedo: history.future.length > 0,
    retry,
    settle: (choices) => {
      if (state.kind === "clash") takeIn(document, state.current, choices);
    },
  };
}
