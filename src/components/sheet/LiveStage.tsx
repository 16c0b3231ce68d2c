import { useCallback, useDeferredValue, useId } from "react";
import { formatPartValue } from "#lib/circuit/index.ts";
import { useTopology } from "#lib/client/stage/useTopology.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import { writeAddress } from "#lib/wire/stageAddress.ts";
import { nearestParts, type StageState } from "#lib/wire/stageState.ts";
import "../../styles/stage.css";
import "../../styles/plot.css";
import { Plot } from "../plot/Plot.tsx";
import { Conditions } from "./Conditions.tsx";
import { ResultsTable } from "./ResultsTable.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { Targets } from "./Targets.tsx";
import { useStage } from "./useStage.ts";

interface LiveStageProps {
  kind: KindBrief;
  initial: StageState;
}

/** One stage, alive on the first page: ask for something, and read the values that exist and what they give. */
export function LiveStage(props: LiveStageProps) {
  // The island itself must not wait: the framework calls it once, outside React, to see what it is.
  return <Alive {...props} />;
}

function Alive({ kind, initial }: LiveStageProps) {
  const topology = useTopology(kind.id, initial.topology);
  const settle = useCallback(
    (next: StageState, before: StageState) =>
      next.targets === before.targets ? next : { ...next, parts: nearestParts(topology, next) },
    [topology],
  );
  const stage = useStage(kind, topology, initial, { settle });
  const drawn = useDeferredValue(stage.state);
  const id = useId();
  const wanted = Object.values(topology.targets).map(({ result }) => result);
  const curve = topology.curves[0];
  return (
    <div className="sheet stage live-stage">
      <div className="sheet-head">
        <h2>{kind.name}</h2>
        <p className="aside">{kind.summary}</p>
        <div className="act">
          <a className="btn btn-primary" href={`/calculators/${kind.id}?${writeAddress(topology, stage.state)}`}>
            Open in the calculator
          </a>
        </div>
      </div>
      <div className="live-cols">
        <section aria-labelledby={`${id}-targets`}>
          <h3 id={`${id}-targets`}>Ask for</h3>
          <Targets stage={stage} id={`${id}-target`} readOnly={false} />
          <Conditions stage={stage} id={`${id}-condition`} readOnly={false} only="turned" />
        </section>
        <div className="live-curve">
          {curve && <Plot topology={topology} curve={curve} stage={drawn} fileName={`${kind.id}-${topology.id}`} />}
        </div>
        <section aria-labelledby={`${id}-results`}>
          <h3 id={`${id}-results`}>Get</h3>
          <ResultsTable stage={stage} only={wanted} />
          <h3 className="live-parts-head">From values that exist</h3>
          <ul className="live-parts">
            {Object.entries(topology.parts)
              .filter(([key]) => stage.state.parts[key]! > 0)
              .map(([key, field]) => (
                <li key={key}>
                  <SymbolText symbol={field.symbol} />{" "}
                  <span className="val">{formatPartValue(stage.state.parts[key]!, field.unit)}</span>
                </li>
              ))}
          </ul>
        </section>
      </div>
    </div>
  );
}
