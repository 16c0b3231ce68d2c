import { useState } from "react";
import { changeWorkingCopy, withoutStage, type SaveOutcome, type WorkingCopy } from "#lib/client/workingCopy.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { StateMark, type FigureState } from "../page/StateMark.tsx";
import { Confirmed } from "./Confirmed.tsx";

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

function problemText(outcome: Exclude<SaveOutcome, { kind: "saved" }>): string {
  switch (outcome.kind) {
    case "conflict":
      return "Someone else is saving this voice just now. Nothing was removed: load the page again and repeat it.";
    case "signed-out":
      return "Your sign-in has expired. Nothing was removed: sign in in another tab, then repeat it.";
    case "unreachable":
      return "The server could not be reached. Nothing was removed: check the connection, then repeat it.";
    case "refused":
      return outcome.detail;
  }
}

export function StageList({ voiceId, rows, copy, editable }: StageListProps) {
  const [shown, setShown] = useState(rows);
  const [current, setCurrent] = useState(copy);
  const [busy, setBusy] = useState<string | null>(null);
  const [message, setMessage] = useState<{ kind: "fault" | "done"; text: string } | null>(null);

  const remove = async ({ id, name }: StageRow) => {
    setBusy(id);
    setMessage(null);
    const outcome = await changeWorkingCopy(voiceId, current, (document) => withoutStage(document, id));
    setBusy(null);
    if (outcome.kind !== "saved") return setMessage({ kind: "fault", text: problemText(outcome) });
    setCurrent(outcome.copy);
    setShown((before) => before.filter((row) => row.id !== id));
    setMessage({ kind: "done", text: `${name} was removed.` });
  };

  return (
    <>
      {message !== null && <FormMessage kind={message.kind}>{message.text}</FormMessage>}
      {shown.length === 0 ? (
        <p className="prose text-ink-2">
          No stage yet. Size one in a calculator and save it into this voice: it then stands here with its figures, and
          its parts carry reference designators.
        </p>
      ) : (
        <table className="table table-stacks">
          <thead>
            <tr>
              <th scope="col">Stage</th>
              <th scope="col">Gives</th>
              <th scope="col">State</th>
              <th scope="col" className="only-wide">
                Parts
              </th>
              {editable && (
                <th scope="col" className="right">
                  <span className="sr-only">Remove</span>
                </th>
              )}
            </tr>
          </thead>
          <tbody>
            {shown.map((row) => (
              <tr key={row.id}>
                <th scope="row" className="wrap-anywhere">
                  <a href={`/voices/${voiceId}/stages/${row.id}`}>{row.name}</a>
                  <span className="block text-small text-ink-2">{row.network}</span>
                </th>
                <td>
                  {row.figures.map(({ label, value, unit }) => (
                    <span key={label} className="block whitespace-nowrap">
                      <span className="fig">{value}</span> <span className="dim">{unit}</span>{" "}
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
                {editable && (
                  <td className="right text-small">
                    <Confirmed
                      label="Remove"
                      warning={
                        <>
                          <strong>{row.name}</strong> leaves this voice with its values and designators.
                        </>
                      }
                      confirmLabel="Remove it"
                      keepLabel="Keep it"
                      busy={busy === row.id}
                      onConfirm={() => void remove(row)}
                    />
                  </td>
                )}
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </>
  );
}
