import { useEffect, useMemo, useRef, useState } from "react";
import type { Remedy, SpreadLook, SpreadView } from "#lib/circuit/analysis/spread/index.ts";
import { startSpreadRunner, type SpreadRunner } from "#lib/client/stage/spreadRunner.ts";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { readSettings, startingSettings, type SpreadSettings } from "./settings.ts";

/** Long enough for another digit, short enough that the first boards come at once. */
const pause = 80;

export type RemedySearch = { kind: "none" } | { kind: "working" } | { kind: "found"; remedy: Remedy };

/** The panel's fields, and the boards drawn for them; every change on the sheet or in the panel draws anew. */
export function useSpread({ kind, topology, state }: StagePanelProps) {
  const [settings, setSettings] = useState(() => startingSettings(topology, kind.telling[0]));
  const [view, setView] = useState<SpreadView | null>(null);
  /** The question whose boards are all drawn, or that were stopped. */
  const [ended, setEnded] = useState<string>();
  const [failed, setFailed] = useState(false);
  const [search, setSearch] = useState<RemedySearch>({ kind: "none" });
  const runner = useRef<SpreadRunner | null>(null);
  const read = useMemo(() => readSettings(topology, state, settings), [topology, state, settings]);
  const against = Object.values(topology.targets).find(({ result }) => result !== settings.result)?.result;
  const look = useRef<SpreadLook>({ result: settings.result });
  const question = read.request && JSON.stringify(read.request);
  const running = useRef<string>(undefined);

  useEffect(() => {
    look.current = { result: settings.result, ...(against !== undefined && { against }) };
    runner.current?.look(look.current);
  }, [settings.result, against]);

  useEffect(() => {
    runner.current = startSpreadRunner({
      view: (next, done) => {
        setView(next);
        if (done) setEnded(running.current);
      },
      remedy: (remedy) => setSearch({ kind: "found", remedy }),
      failed: () => setFailed(true),
    });
    return () => runner.current?.end();
  }, []);

  useEffect(() => {
    if (question === undefined) return undefined;
    const timer = setTimeout(() => {
      running.current = question;
      setEnded(undefined);
      setFailed(false);
      setSearch({ kind: "none" });
      runner.current?.run(kind.id, topology.id, JSON.parse(question) as never, look.current);
    }, pause);
    return () => clearTimeout(timer);
  }, [question, kind.id, topology.id]);

  return {
    settings,
    change: (part: Partial<SpreadSettings>) => setSettings((now) => ({ ...now, ...part })),
    faults: read.faults,
    request: read.request,
    against,
    view,
    // What is typed but not yet asked counts as being drawn: nothing may build on the boards before it.
    phase: failed
      ? ("failed" as const)
      : ended !== undefined && ended === question
        ? ("ended" as const)
        : ("drawing" as const),
    search,
    stop: () => runner.current?.stop(),
    findRemedy: (wanted: number) => {
      setSearch({ kind: "working" });
      runner.current?.remedy(wanted);
    },
  };
}

export type Spread = ReturnType<typeof useSpread>;
