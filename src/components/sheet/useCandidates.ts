import { useEffect, useMemo, useRef, useState } from "react";
import type { SolveRequest } from "#lib/circuit/index.ts";
import { startSolver, type Solver, type SolveOutcome } from "#lib/client/stage/solver.ts";
import { decidedParts } from "#lib/wire/stageState.ts";
import type { Stage } from "./useStage.ts";

export type CandidateSearch =
  { kind: "working"; before: SolveOutcome | null } | { kind: "done"; outcome: SolveOutcome } | { kind: "failed" };

/** Long enough to type another digit. */
const pause = 200;

/**
 * Values that exist for the present targets, followed live while `open`.
 *
 * @param keep whether the anchors (a capacitor value already decided) stay as they are chosen
 */
export function useCandidates(stage: Stage, open: boolean, keep: boolean): CandidateSearch {
  const { kind, topology, state } = stage;
  const solver = useRef<Solver | null>(null);
  const [search, setSearch] = useState<{ question: string; result: SolveOutcome | "failed" } | null>(null);

  const request = useMemo((): SolveRequest => {
    const decided = decidedParts(topology, state.parts);
    const anchors = new Set(topology.anchors.flatMap(({ part, follows = [] }) => [part, ...follows]));
    const given = Object.fromEntries(Object.entries(decided).filter(([key]) => keep || !anchors.has(key)));
    return {
      targets: state.targets,
      conditions: state.conditions,
      windows: state.windows,
      series: state.series,
      given,
      count: 8,
    };
  }, [topology, state.targets, state.conditions, state.windows, state.series, state.parts, keep]);
  // Taking a candidate changes parts that the question does not depend on: the same question is not asked twice.
  const question = JSON.stringify(request);

  useEffect(() => {
    if (!open) return undefined;
    const timer = setTimeout(() => {
      solver.current?.stop();
      solver.current = startSolver(
        (outcome) => setSearch({ question, result: outcome }),
        () => setSearch({ question, result: "failed" }),
      );
      solver.current.ask(kind.id, topology.id, JSON.parse(question) as SolveRequest);
    }, pause);
    return () => clearTimeout(timer);
  }, [open, question, kind.id, topology.id]);
  useEffect(() => () => solver.current?.stop(), []);

  if (search?.question !== question) {
    return { kind: "working", before: search === null || search.result === "failed" ? null : search.result };
  }
  return search.result === "failed" ? { kind: "failed" } : { kind: "done", outcome: search.result };
}
