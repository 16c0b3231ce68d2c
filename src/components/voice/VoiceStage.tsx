import { useEffect, useRef, useState } from "react";
import { marksOf } from "#lib/client/stage/marks.ts";
import { useTopology } from "#lib/client/stage/useTopology.ts";
import { useStageSave } from "#lib/client/useStageSave.ts";
import type { StoredStage, WorkingCopy } from "#lib/client/workingCopy.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import { stageNameFault } from "#lib/wire/stageName.ts";
import { stateOfSaved, type StageState } from "#lib/wire/stageState.ts";
import { plainSymbol } from "../sheet/SymbolText.tsx";
import { StageSheet } from "../sheet/StageSheet.tsx";
import { MarkField } from "./MarkField.tsx";
import { SaveLine } from "./SaveLine.tsx";

interface VoiceStageProps {
  voiceId: string;
  stageId: string;
  /** Of the stage. */
  kind: KindBrief;
  copy: WorkingCopy;
  /** Why saving is not offered, for a role that only reads. */
  readOnly?: string | undefined;
}

/** A stage of a voice on its sheet, kept in the voice's working copy. */
export function VoiceStage(props: VoiceStageProps) {
  // The island itself must not wait: the framework calls it once, outside React, to see what it is.
  return <KeptStage {...props} />;
}

function KeptStage({ voiceId, stageId, kind, copy, readOnly }: VoiceStageProps) {
  const first = copy.document.stages.find(({ id }) => id === stageId)!;
  const topology = useTopology(first.kind, first.topology);
  const saving = useStageSave(voiceId, copy);
  const newest = saving.newest.document.stages;
  const stored = newest.find(({ id }) => id === stageId) ?? first;
  const [start, setStart] = useState(() => stateOfSaved(topology, first));
  const [state, setState] = useState(start);
  const [name, setName] = useState(first.name);
  const [typed, setTyped] = useState<Record<string, string>>({});
  const [turnsBack, setTurnsBack] = useState(0);
  const place = useRef<HTMLDivElement>(null);

  const { parts, conditions, targets, windows } = state;
  const others = newest.filter(({ id }) => id !== stageId);
  const marks = marksOf({ topology, parts, saved: stored.designators, typed, others });
  const faulty = Object.keys(marks.faults)[0];
  const nameFault = stageNameFault(name);

  const take = (next: StageState) => {
    setState(next);
    saving.touch();
  };
  const edited = (): StoredStage => ({
    ...stored,
    ...{ topology: state.topology, name: name.trim(), parts, conditions, targets, windows },
    designators: marks.designators,
  });
  /** The stage to be saved; where something cannot be, its field takes the focus, and says so itself. */
  const savable = () => {
    if (faulty === undefined && nameFault === undefined) return edited();
    place.current?.querySelector<HTMLElement>(".input-mark[aria-invalid], .stage-name[aria-invalid]")?.focus();
    return null;
  };
  const turnBack = () => {
    const saved = saving.turnBack().document.stages.find(({ id }) => id === stageId) ?? first;
    const before = stateOfSaved(topology, saved);
    setStart(before);
    setState(before);
    setName(saved.name);
    setTyped({});
    setTurnsBack((count) => count + 1);
  };
  useStageNameOnPage(stored.name);
  // The sheet begins anew with the saved values, and the pressed button with it.
  useEffect(() => {
    if (turnsBack > 0) place.current?.querySelector<HTMLElement>(".btn-primary")?.focus();
  }, [turnsBack]);

  const plainName = (part: string) => `${plainSymbol(topology.parts[part]!.symbol)}, ${topology.parts[part]!.label}`;
  return (
    <div ref={place}>
      <StageSheet
        key={turnsBack}
        kind={kind}
        topology={topology}
        initial={start}
        onChange={take}
        designators={marks.designators}
        readOnly={readOnly !== undefined}
        marks={
          readOnly === undefined
            ? {
                fault: faulty === undefined ? undefined : `${plainName(faulty)}: ${marks.faults[faulty]}`,
                field: (part, noteId) =>
                  part in marks.typed && (
                    <MarkField
                      label={plainName(part)}
                      text={marks.typed[part]!}
                      faulty={part in marks.faults}
                      noteId={noteId}
                      onText={(text) => {
                        setTyped({ ...typed, [part]: text });
                        saving.touch();
                      }}
                    />
                  ),
              }
            : undefined
        }
      >
        <div className="save-panel">
          {readOnly === undefined ? (
            <SaveLine
              voiceId={voiceId}
              saving={saving}
              savable={savable}
              onTurnBack={turnBack}
              name={name}
              nameFault={nameFault}
              onName={(text) => {
                setName(text);
                saving.touch();
              }}
            />
          ) : (
            <p className="note">{readOnly}</p>
          )}
        </div>
      </StageSheet>
    </div>
  );
}

/** The heading stands outside this island: after a save under another name, it follows. */
function useStageNameOnPage(name: string) {
  const shown = useRef(name);
  useEffect(() => {
    if (shown.current === name) return;
    shown.current = name;
    document.title = `${name} · Clatterbench`;
    const heading = document.querySelector("h1");
    if (heading) heading.textContent = name;
  }, [name]);
}
