import { useCallback, useMemo, useState } from "react";
import {
  analyseStage,
  designExactly,
  isRefusal,
  sensitivities,
  type AnyTopology,
  type PlainValues,
} from "#lib/circuit/index.ts";
import { partText } from "#lib/wire/figureText.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import { decidedParts, idealConditions, type SeriesChoice, type StageState } from "#lib/wire/stageState.ts";
import { fieldsOf } from "./fields.ts";
import { fieldStore } from "./fieldStore.ts";

export type Stage = ReturnType<typeof useStage>;

interface StageWatcher {
  /** Told of every change. */
  onChange?: ((state: StageState) => void) | undefined;
  /** Lets a change bring others with it: parts that follow their targets. */
  settle?: (next: StageState, before: StageState) => StageState;
}

/** A stage being worked on: what stands in its fields, the values in force, and everything that follows from them. */
export function useStage(
  kind: KindBrief,
  topology: AnyTopology,
  initial: StageState,
  { onChange, settle }: StageWatcher = {},
) {
  const [state, setState] = useState(initial);
  const [fields] = useState(() => fieldStore(fieldsOf(topology, initial)));

  const change = useCallback(
    (wanted: StageState) => {
      const next = settle?.(wanted, state) ?? wanted;
      setState(next);
      onChange?.(next);
    },
    [onChange, settle, state],
  );
  const actions = useMemo(
    () => ({
      set: (group: "targets" | "windows" | "parts", key: string, value: number) =>
        change({ ...state, [group]: { ...state[group], [key]: value } }),
      setCondition: (key: string, value: number | string | null) =>
        change({ ...state, conditions: { ...state.conditions, [key]: value } }),
      setSeries: (series: SeriesChoice) => change({ ...state, series }),
      /** Several parts at once, their fields with them; the others stay. */
      applyParts: (parts: PlainValues) => {
        for (const [key, value] of Object.entries(parts)) {
          fields.set(`parts.${key}`, partText(value, topology.parts[key]!.unit));
        }
        change({ ...state, parts: { ...state.parts, ...parts } });
      },
    }),
    [change, fields, state, topology],
  );

  const analysis = useMemo(() => analyseStage(topology, state), [topology, state]);
  const ideal = useMemo(() => {
    const { conditions, differs } = idealConditions(topology, state.conditions);
    return differs ? analyseStage(topology, { parts: state.parts, conditions }).results : undefined;
  }, [topology, state.conditions, state.parts]);
  const design = useMemo(
    () =>
      Object.keys(topology.targets).length === 0
        ? undefined
        : designExactly(topology, state.targets, state.conditions, decidedParts(topology, state.parts)),
    [topology, state.targets, state.conditions, state.parts],
  );
  const [watched, setWatched] = useState(() => firstMoved(kind, topology, initial));
  const moves = useMemo(
    () => sensitivities(topology, state.parts, state.conditions, watched),
    [topology, state.parts, state.conditions, watched],
  );
  const refusal = design && isRefusal(design) ? design : undefined;
  const exact = design && !isRefusal(design) ? design : undefined;
  return { kind, topology, state, fields, actions, analysis, ideal, exact, refusal, moves, watched, setWatched };
}

/** Units whose figures are logarithms already: a change of them in per cent says nothing. */
const logarithms = new Set(["dB", "semitones", "cents/°"]);

/** Results whose change with a part says something: the telling ones, and those that are aimed at. */
export function watchable(kind: KindBrief, topology: AnyTopology): string[] {
  const keys = new Set([...kind.telling, ...Object.values(topology.targets).map(({ result }) => result)]);
  return [...keys].filter((key) => !logarithms.has(topology.results[key]?.unit ?? "dB"));
}

/** The first of them that any part moves: a count of hits, say, stays what it is. */
function firstMoved(kind: KindBrief, topology: AnyTopology, { parts, conditions }: StageState): string {
  const moved = (result: string) =>
    Object.values(sensitivities(topology, parts, conditions, result)).some((slope) => Math.abs(slope) > 0.005);
  return watchable(kind, topology).find(moved) ?? kind.telling[0];
}
