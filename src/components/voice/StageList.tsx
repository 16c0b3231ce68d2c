import { useEffect, useState, type ReactNode } from "react";
import { saveFailure } from "#lib/client/saveFailure.ts";
import { sameStages, withStageMoved, withStageRenamed } from "#lib/client/stageChanges.ts";
import {
  changeWorkingCopy,
  withoutStage,
  type WorkingCopy,
  type WorkingCopyDocument,
} from "#lib/client/workingCopy.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { StateMark, type FigureState } from "../page/StateMark.tsx";
import { StageRowActions } from "./StageRowActions.tsx";

export interface StageRow {
  id: string;
  name: string;
  /** Kind and topology in words. */
  network: string;
  figures: { label: string; value: string; unit: string }[];
  state: FigureState;
  designators: string[];
}

interface StageListProps {
  voiceId: string;
  rows: StageRow[];
  copy: WorkingCopy;
  editable: boolean;
}

/** The rows in the order and under the names of the document; one that this page has not read yet is not among them. */
function rowsOf(document: WorkingCopyDocument, known: readonly StageRow[]): StageRow[] {
  return document.stages.flatMap(({ id, name }) =>
    known.filter((row) => row.id === id).map((row) => ({ ...row, name })),
  );
}

export function StageList({ voiceId, rows, copy, editable }: StageListProps) {
  const [current, setCurrent] = useState(copy);
  const [changing, setChanging] = useState(false);
  const [busy, setBusy] = useState(false);
  const [message, setMessage] = useState<{ kind: "fault" | "done"; text: ReactNode } | null>(null);
  const [moved, setMoved] = useState<{ button: string } | null>(null);
  const shown = rowsOf(current.document, rows);

  const change = async (edit: (document: WorkingCopyDocument) => WorkingCopyDocument, done: string) => {
    setBusy(true);
    setMessage(null);
    const outcome = await changeWorkingCopy(voiceId, current, edit);
    setBusy(false);
    if (outcome.kind !== "saved") {
      setMessage({ kind: "fault", text: saveFailure(outcome) });
      return false;
    }
    const foreign = !sameStages(edit(current.document), outcome.copy.document);
    setCurrent(outcome.copy);
    setMessage({ kind: "done", text: foreign ? <ForeignSave voiceId={voiceId} done={done} /> : done });
    return true;
  };

  const move = async ({ id, name }: StageRow, by: -1 | 1) => {
    const done = `${name} stands one place ${by === -1 ? "earlier" : "later"}.`;
    if (await change((document) => withStageMoved(document, id, by), done))
      setMoved({ button: `${id}-${by === -1 ? "up" : "down"}` });
  };
  // The row took its buttons along, and the browser may have let go of the one in use.
  useEffect(() => {
    if (moved) document.getElementById(moved.button)?.focus();
  }, [moved]);

  if (shown.length === 0 && message === null) {
    return (
      <p className="prose text-ink-2">
        No stage yet. Size one in a calculator and save it into this voice: it then stands here with its figures, and
        its parts carry reference designators.
      </p>
    );
  }
  return (
    <>
      {editable && shown.length > 0 && (
        <p className="needs-js mb-2">
          <button type="button" className="btn" aria-pressed={changing} onClick={() => setChanging(!changing)}>
            {changing ? "Done with the list" : "Rename, move or remove"}
          </button>
        </p>
      )}
      {message !== null && <FormMessage kind={message.kind}>{message.text}</FormMessage>}
      <table className="table table-stacks stage-list">
        <thead>
          <tr>
            <th scope="col">Stage</th>
            <th scope="col">Gives</th>
            <th scope="col">State</th>
            <th scope="col" className="only-wide">
              Parts
            </th>
          </tr>
        </thead>
        <tbody>
          {shown.map((row, index) => (
            <tr key={row.id}>
              <th scope="row" className="wrap-anywhere">
                <a href={`/voices/${voiceId}/stages/${row.id}`}>{row.name}</a>
                <span className="block text-small text-ink-2">{row.network}</span>
                {changing && (
                  <StageRowActions
                    id={row.id}
                    name={row.name}
                    isFirst={index === 0}
                    isLast={index === shown.length - 1}
                    busy={busy}
                    onMove={(by) => void move(row, by)}
                    onRename={(name) =>
                      change((document) => withStageRenamed(document, row.id, name), `${row.name} is now ${name}.`)
                    }
                    onRemove={() =>
                      void change((document) => withoutStage(document, row.id), `${row.name} was removed.`)
                    }
                  />
                )}
              </th>
              <td className="gives">
                {row.figures.map(({ label, value, unit }) => (
                  <span key={label} className="block">
                    <span className="fig whitespace-nowrap">
                      {value} <span className="dim">{unit}</span>
                    </span>{" "}
                    <span className="text-small text-ink-2">{label}</span>
                  </span>
                ))}
              </td>
              <td>
                <StateMark state={row.state} />
              </td>
              <td className="only-wide">
                <span className="val text-ink-2">{row.designators.join(" ")}</span>
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}

function ForeignSave({ voiceId, done }: { voiceId: string; done: string }) {
  return (
    <>
      {done} Somebody else saved this voice meanwhile: <a href={`/voices/${voiceId}`}>load the page again</a> to see
      their changes as well.
    </>
  );
}
