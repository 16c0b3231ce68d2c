import { useEffect, useMemo, useRef, useState } from "react";
import type { Revaluation, TrimCoverage, TrimFigures } from "#lib/circuit/analysis/trim/index.ts";
import { startTrimRunner, type TrimRunner } from "#lib/client/stage/trimRunner.ts";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { readTrim, startingTrim, type TrimSettings } from "./settings.ts";

/** Long enough for another digit. */
const pause = 100;

/** The panel's fields, and what the knob does with them; every change turns it anew. */
export function useTrim({ kind, topology, state }: StagePanelProps) {
  const [settings, setSettings] = useState(() => startingTrim(topology, state, kind.telling));
  const [figures, setFigures] = useState<TrimFigures | null>(null);
  const [coverage, setCoverage] = useState<TrimCoverage | null>(null);
  const [revaluation, setRevaluation] = useState<Revaluation | "working" | null>(null);
  const [failed, setFailed] = useState(false);
  const [asked, setAsked] = useState<string>();
  const runner = useRef<TrimRunner | null>(null);
  const read = useMemo(() => readTrim(topology, state, settings), [topology, state, settings]);
  const question = read.request && JSON.stringify(read.request);

  useEffect(() => {
    runner.current = startTrimRunner({
      figures: setFigures,
      coverage: setCoverage,
      revaluation: setRevaluation,
      failed: () => setFailed(true),
    });
    return () => runner.current?.end();
  }, []);

  useEffect(() => {
    if (question === undefined) return undefined;
    const timer = setTimeout(() => {
      setFailed(false);
      setRevaluation(null);
      setAsked(question);
      runner.current?.run(kind.id, topology.id, JSON.parse(question) as never);
    }, pause);
    return () => {
      clearTimeout(timer);
      setAsked(undefined);
    };
  }, [question, kind.id, topology.id]);

  return {
    settings,
    change: (part: Partial<TrimSettings>) => setSettings((now) => ({ ...now, ...part })),
    faults: read.faults,
    request: read.request,
    figures,
    coverage,
    revaluation,
    failed,
    // A search begun before the question has been asked would be ended by it.
    pending: asked !== question,
    revalue: () => {
      if (!read.request || read.useful === undefined) return;
      setRevaluation("working");
      runner.current?.revalue(kind.id, topology.id, read.request, { useful: read.useful });
    },
  };
}

export type Trim = ReturnType<typeof useTrim>;
