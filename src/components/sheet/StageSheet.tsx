import { useDeferredValue, useId, useMemo, useRef, useState, type ReactNode } from "react";
import type { AnyTopology } from "#lib/circuit/index.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import "../../styles/stage.css";
import "../../styles/plot.css";
import { NetworkDrawing } from "../network/NetworkDrawing.tsx";
import { later } from "../page/later.tsx";
import { Conditions } from "./Conditions.tsx";
import { Curves } from "./Curves.tsx";
import { deviceName } from "./deviceName.ts";
import { PartChoosers } from "./PartChoosers.tsx";
import { PartsTable, type PartMarks } from "./PartsTable.tsx";
import { ResultsTable } from "./ResultsTable.tsx";
import { SpokenResults } from "./SpokenResults.tsx";
import { StagePanels } from "./StagePanels.tsx";
import { stagePanels } from "./stagePanels.ts";
import { Targets } from "./Targets.tsx";
import { TextWithSymbols } from "./TextWithSymbols.tsx";
import { useStage } from "./useStage.ts";
import { Warnings } from "./Warnings.tsx";

const Candidates = later(() => import("./Candidates.tsx").then((module) => module.Candidates), {
  waiting: "Working out parts…",
  className: "stage-candidates",
});

/** With more results than this, their column is as high as two curves. */
const manyResults = 20;

export interface StageSheetProps {
  kind: KindBrief;
  topology: AnyTopology;
  initial: StageState;
  /** Told of every change, with values that can be computed with. */
  onChange?: ((state: StageState) => void) | undefined;
  /** By part, where the stage stands in a voice. */
  designators?: Record<string, string> | undefined;
  /** Where the designators can be typed over. */
  marks?: PartMarks | undefined;
  readOnly?: boolean;
  /** Buttons at the right of the heading. */
  actions?: ReactNode;
  /** Between the heading and the columns: how a save went. */
  children?: ReactNode;
}

/** One stage as the work goes: targets, parts, results, curves, and what the figures leave out. */
export function StageSheet({ kind, topology, initial, onChange, ...props }: StageSheetProps) {
  const { designators = {}, marks, readOnly = false, actions, children } = props;
  const stage = useStage(kind, topology, initial, { onChange });
  const { state } = stage;
  const drawn = useDeferredValue(state);
  const [lit, setLit] = useState<string>();
  const [open, setOpen] = useState(false);
  const [keep, setKeep] = useState(false);
  const opener = useRef<HTMLButtonElement>(null);
  const id = useId();
  const canSolve = !readOnly && Object.keys(topology.targets).length > 0 && Object.keys(topology.parts).length > 0;
  const fileName = `${kind.id}-${topology.id}`;
  const besides = useState(() => (Object.keys(stage.analysis.results).length > manyResults ? 2 : 1))[0];
  const [mainCurves, otherCurves] = useMemo(
    () => [topology.curves.slice(0, besides), topology.curves.slice(besides)],
    [topology, besides],
  );

  return (
    <div className="sheet stage">
      <div className="sheet-head">
        <h2>{topology.name}</h2>
        <p className="aside">{topology.summary}</p>
        {actions !== undefined && <div className="act">{actions}</div>}
      </div>
      {children}
      <div className="stage-cols">
        <section className="stage-targets" aria-labelledby={`${id}-targets`}>
          <h3 id={`${id}-targets`}>Targets</h3>
          <Targets stage={stage} id={`${id}-target`} readOnly={readOnly} />
          <Conditions stage={stage} id={`${id}-condition`} readOnly={readOnly} />
        </section>
        <section className="stage-parts" aria-labelledby={`${id}-parts`}>
          <h3 id={`${id}-parts`}>Parts</h3>
          <PartsTable
            stage={stage}
            id={`${id}-part`}
            designators={designators}
            marks={marks}
            readOnly={readOnly}
            onLit={setLit}
          />
          {topology.devices.length > 0 && (
            <ul className="devices" aria-label="Devices">
              {topology.devices.map((device) => (
                <li key={device.key}>
                  <span className="val part-mark">{designators[device.key] ?? deviceName(topology, device)}</span>{" "}
                  <span className="text-ink-2">
                    {device.label}: {device.deviceClass}
                  </span>
                </li>
              ))}
            </ul>
          )}
          {canSolve && (
            <div className="parts-foot needs-js no-print">
              <button
                ref={opener}
                type="button"
                className="btn"
                aria-expanded={open}
                aria-controls={`${id}-candidates`}
                onClick={() => setOpen(!open)}
              >
                Work out parts
              </button>
              <PartChoosers stage={stage} id={`${id}-choice`} />
            </div>
          )}
        </section>
        <div id={`${id}-candidates`} className="stage-candidates-place" hidden={!open}>
          {open && (
            <Candidates
              stage={stage}
              id={`${id}-candidate`}
              keep={keep}
              onKeep={setKeep}
              onClose={() => {
                setOpen(false);
                opener.current?.focus();
              }}
              designators={designators}
            />
          )}
        </div>
        <section className="stage-results" aria-labelledby={`${id}-results`}>
          <h3 id={`${id}-results`}>Results</h3>
          <ResultsTable stage={stage} />
          <Warnings warnings={stage.analysis.warnings} />
          <SpokenResults stage={stage} />
        </section>
        {mainCurves.length > 0 && (
          <section className="stage-first-curve" aria-label="Main curves">
            <Curves topology={topology} curves={mainCurves} state={drawn} fileName={fileName} />
          </section>
        )}
      </div>
      <StagePanels
        panels={stagePanels}
        stage={{ kind, topology, state, designators, readOnly, apply: stage.actions.applyParts }}
      />
      <section className="stage-curves" aria-label="Curves and network">
        <Curves topology={topology} curves={otherCurves} state={drawn} fileName={fileName} />
        <NetworkDrawing topology={topology} parts={state.parts} designators={designators} lit={lit} />
      </section>
      {topology.leavesOut.length > 0 && (
        <p className="sheet-foot">
          <strong>Left out of these figures:</strong> <TextWithSymbols text={topology.leavesOut.join("; ")} />.
        </p>
      )}
    </div>
  );
}
