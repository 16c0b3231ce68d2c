import { lazy, Suspense, useMemo, useState, type KeyboardEvent } from "react";
import { portsOf, type ChainLink } from "#lib/circuit/voice/index.ts";
import { computing } from "#lib/client/voice/computing.ts";
import { linkFault, withLink } from "#lib/client/voice/stageEdits.ts";
import { useLibrary } from "#lib/client/voice/useLibrary.ts";
import { useVoiceDocument } from "#lib/client/voice/useVoiceDocument.ts";
import type { WorkingCopy, WorkingCopyDocument } from "#lib/client/workingCopy.ts";
import { StageList, type StageRow } from "../voice/StageList.tsx";
import { rowsOfChain } from "../voice/stageRows.ts";
import type { DrawnStage } from "./ChainDrawing.tsx";
import { ChainToolbar } from "./ChainToolbar.tsx";
import { KeptLine } from "./KeptLine.tsx";
import { StagePanel } from "./StagePanel.tsx";

const ChainDrawing = lazy(() => import("./ChainDrawing.tsx"));

interface ChainEditorProps {
  voiceId: string;
  copy: WorkingCopy;
  /** The stages as the server computed them, shown until the library is there. */
  rows: StageRow[];
  editable: boolean;
}

/** A voice as a chain: drawn where there is room, and as a list everywhere; edited, linked, undone and kept. */
export function ChainEditor({ voiceId, copy, rows, editable }: ChainEditorProps) {
  const kept = useVoiceDocument(voiceId, copy);
  const { document, change } = kept;
  const library = useLibrary();
  const [compute] = useState(computing);
  const [chosen, setChosen] = useState<string>();
  const [said, setSaid] = useState("");
  const computed = useMemo(() => library && compute(document, library.find), [compute, document, library]);
  const shown = useMemo(() => (computed ? rowsOfChain(computed) : rows), [computed, rows]);
  const drawn = shown.flatMap((row): DrawnStage[] => {
    const found = computed?.stages.get(row.id);
    if (!found) return [{ row, ports: [], lane: "lower", apart: false }];
    const lane = found.found.kind.place === "audio" ? "lower" : "upper";
    return [
      {
        row,
        ports: linkedOrFitted(found, document),
        lane: soundOnly(found, document) ? "lower" : lane,
        apart: found.stage.apart ?? false,
      },
    ];
  });
  const act = (edit: (document: WorkingCopyDocument) => WorkingCopyDocument, done: string) => {
    change(edit);
    setSaid(done);
  };
  const link = (ends: Pick<ChainLink, "from" | "to">) => {
    const fault = library && linkFault(document, ends, library.find);
    if (fault !== undefined) return setSaid(`Not linked. ${fault}`);
    act((now) => withLink(now, ends), "Linked.");
  };
  const keys = (event: KeyboardEvent) => {
    const typing = (event.target as HTMLElement).closest("input, select, textarea") !== null;
    if (typing || !editable || !(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== "z") return;
    event.preventDefault();
    if (event.shiftKey) kept.redo();
    else kept.undo();
  };
  const chosenStage = chosen === undefined ? undefined : document.stages.find(({ id }) => id === chosen);
  return (
    // Undo by keyboard, wherever in the chain the focus is.
    // eslint-disable-next-line jsx-a11y-x/no-static-element-interactions
    <div onKeyDown={keys}>
      {editable && <ChainToolbar kept={kept} library={library} onAct={act} onAdded={setChosen} />}
      {editable && <KeptLine voiceId={voiceId} kept={kept} said={said} />}
      {drawn.length > 0 && (
        <div className="chain-sheet sheet-grid only-roomy needs-js">
          {library ? (
            <Suspense fallback={<p className="chain-wait">Drawing the chain…</p>}>
              <ChainDrawing
                stages={drawn}
                links={document.links}
                chosen={chosen}
                editable={editable}
                onChoose={(id) => setChosen(id === chosen ? undefined : id)}
                onLink={link}
              />
            </Suspense>
          ) : (
            <p className="chain-wait">Drawing the chain…</p>
          )}
        </div>
      )}
      {chosenStage && computed && library && (
        <StagePanel
          key={chosenStage.id}
          voiceId={voiceId}
          stage={chosenStage}
          computed={computed}
          library={library}
          editable={editable}
          onAct={act}
          onLink={link}
          onClose={() => setChosen(undefined)}
        />
      )}
      <section className="sheet-body">
        <h2 className="mb-2 text-body">Stages</h2>
        <StageList voiceId={voiceId} rows={shown} editable={editable} onChange={act} />
        {drawn.length > 0 && library && (
          <details className="mt-3">
            <summary className="cursor-pointer">Links, as a list</summary>
            <LinkList document={document} name={(id) => shown.find((row) => row.id === id)?.name ?? id} />
          </details>
        )}
      </section>
    </div>
  );
}

type Found = NonNullable<
  ReturnType<ReturnType<typeof computing>>["stages"] extends ReadonlyMap<string, infer S> ? S : never
>;

/** Ports worth a place on the box: linked ones, and those whose part is fitted and that may not stay open. */
function linkedOrFitted({ stage, found, conditions }: Found, { links }: WorkingCopyDocument) {
  return portsOf(found).filter(({ id, direction, mayStayOpen }) => {
    const ends = links.map((link) => (direction === "in" ? link.to : link.from));
    if (ends.some((end) => end.stage === stage.id && end.port === id)) return true;
    const fitted = found.topology.joints?.[id]?.fitted?.({ parts: stage.parts, conditions }) !== false;
    return fitted && !mayStayOpen;
  });
}

/** A stage that could stand in either lane stands with what it is linked to. */
function soundOnly({ stage, found }: Found, { links }: WorkingCopyDocument): boolean {
  const sorts = links.flatMap(({ from, to }) => {
    const port = from.stage === stage.id ? from.port : to.stage === stage.id ? to.port : undefined;
    return found.kind.ports.find(({ id }) => id === port)?.sort ?? [];
  });
  return sorts.length > 0 && sorts.every((sort) => sort === "audio");
}

function LinkList({ document, name }: { document: WorkingCopyDocument; name: (id: string) => string }) {
  if (document.links.length === 0) return <p className="prose text-ink-2">Nothing is linked yet.</p>;
  return (
    <ul className="prose">
      {document.links.map(({ id, from, to }) => (
        <li key={id}>
          {name(from.stage)} feeds {name(to.stage)} ({from.port} to {to.port})
        </li>
      ))}
    </ul>
  );
}
