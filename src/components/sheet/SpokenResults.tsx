import { useEffect, useRef, useState } from "react";
import { formatShown } from "#lib/circuit/index.ts";
import { plainSymbol } from "./SymbolText.tsx";
import type { Stage } from "./useStage.ts";

/** Longer than people take between two digits, so that half a figure is never read out. */
const pause = 1200;

/**
 * For screen readers: how the targets are met and what is newly warned of, said once the values have settled. The table
 * itself changes with every keystroke, and stays silent.
 */
export function SpokenResults({ stage }: { stage: Stage }) {
  const { analysis } = stage;
  const [spoken, setSpoken] = useState("");
  const heard = useRef({ analysis, codes: new Set(analysis.warnings.map(({ code }) => code)) });
  useEffect(() => {
    if (heard.current.analysis === analysis) return undefined;
    const timer = setTimeout(() => {
      setSpoken(summaryOf(stage, heard.current.codes));
      heard.current = { analysis, codes: new Set(analysis.warnings.map(({ code }) => code)) };
    }, pause);
    return () => clearTimeout(timer);
  }, [analysis, stage]);
  return (
    <p className="sr-only" role="status">
      {spoken}
    </p>
  );
}

function summaryOf({ topology, analysis }: Stage, known: ReadonlySet<string>): string {
  const figures = Object.entries(topology.targets).map(([key, { label, result }]) => {
    const value = analysis.results[result];
    const figure = typeof value === "number" ? formatShown(value, topology.results[result]!) : "no figure";
    return `${label} ${figure}, ${analysis.state[key] ?? "not aimed at"}.`;
  });
  const news = analysis.warnings.filter(({ code }) => !known.has(code)).map(({ message }) => plainSymbol(message));
  return [...figures, ...news].join(" ");
}
