import { useEffect, useState } from "react";
import { withStageMoved, withStageRenamed } from "#lib/client/stageChanges.ts";
import { withoutStage, type WorkingCopyDocument } from "#lib/client/workingCopy.ts";
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
  editable: boolean;
  /** Makes a change, and says what was done. */
  onChange: (edit: (document: WorkingCopyDocument) => WorkingCopyDocument, done: string) => void;
}

export function StageList({ voiceId, rows: shown, editable, onChange }: StageListProps) {
  const [changing, setChanging] = useState(false);
  const [moved, setMoved] = useState<{ button: string } | null>(null);

  const move = ({ id, name }: StageRow, by: -1 | 1) => {
    onChange(
      (document) => withStageMoved(document, id, by),
      `${name} stands one place ${by === -1 ? "earlier" : "later"}.`,
    );
    setMoved({ button: `${id}-${by === -1 ? "up" : "down"}` });
  };
  // The row took its buttons along, and the browser may have let go of the one in use.
  useEffect(() => {
    if (moved) document.getElementById(moved.button)?.focus();
  }, [moved]);

  if (shown.length === 0) {
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
                    busy={false}
                    onMove={(by) => move(row, by)}
                    onRename={(name) => {
                      onChange((document) => withStageRenamed(document, row.id, name), `${row.name} is now ${name}.`);
                      return Promise.resolve(true);
                    }}
                    onRemove={() => onChange((document) => withoutStage(document, row.id), `${row.name} was removed.`)}
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
