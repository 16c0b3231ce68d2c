import { useState } from "react";
import { saveFailure } from "#lib/client/saveFailure.ts";
import { changeWorkingCopy, type WorkingCopy } from "#lib/client/workingCopy.ts";
import type { CheckAnswer } from "#lib/wire/check.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { StateMark, type FigureState } from "../page/StateMark.tsx";
import { AcceptForm } from "./AcceptForm.tsx";

type Item = CheckAnswer["items"][number];

interface CheckListProps {
  voiceId: string;
  items: Item[];
  /** Names of the stages, by id. */
  names: Record<string, string>;
  /** For who may accept. */
  copy: WorkingCopy | null;
  /** Name of the person looking. */
  me: string;
}

const marks: Record<Item["severity"], FigureState> = { fault: "outside", caution: "close", note: "unknown" };
const keyOf = ({ stage, code }: Pick<Item, "stage" | "code">) => `${stage} ${code}`;

/** All that is not right with a voice. What somebody accepted says so and stays. */
export function CheckList({ voiceId, items, names, copy, me }: CheckListProps) {
  const [current, setCurrent] = useState(copy);
  const [shown, setShown] = useState(items);
  const [filter, setFilter] = useState<"all" | "open" | Item["severity"]>("all");
  const [asking, setAsking] = useState<string>();
  const [fault, setFault] = useState<string>();

  const judge = async (item: Item, accepted: Item["accepted"]) => {
    if (!current) return;
    setFault(undefined);
    const outcome = await changeWorkingCopy(voiceId, current, (document) => {
      const others = (document.accepted ?? []).filter((one) => keyOf(one) !== keyOf(item));
      return {
        ...document,
        accepted: accepted ? [...others, { stage: item.stage, code: item.code, ...accepted }] : others,
      };
    });
    if (outcome.kind !== "saved") return setFault(saveFailure(outcome));
    setCurrent(outcome.copy);
    setAsking(undefined);
    setShown((all) =>
      all.map((one) => {
        if (keyOf(one) !== keyOf(item)) return one;
        const { accepted: _, ...open } = one;
        return accepted ? { ...open, accepted } : open;
      }),
    );
  };

  if (shown.length === 0) {
    return <p className="prose text-ink-2">Nothing to say: no stage yet, or everything is within its limits.</p>;
  }
  const listed = shown.filter(
    (item) => filter === "all" || (filter === "open" ? !item.accepted : item.severity === filter),
  );
  return (
    <>
      <div className="needs-js no-print mb-3 flex flex-wrap items-end gap-x-5 gap-y-2">
        <div className="field">
          <label htmlFor="check-filter">Show</label>
          <select
            id="check-filter"
            className="input"
            value={filter}
            onChange={(event) => setFilter(event.target.value as typeof filter)}
          >
            <option value="all">all</option>
            <option value="open">what nobody accepted</option>
            <option value="fault">faults</option>
            <option value="caution">cautions</option>
            <option value="note">notes</option>
          </select>
        </div>
        <p className="pb-2 text-small text-ink-2" role="status">
          {listed.length} of {shown.length}
        </p>
      </div>
      {fault !== undefined && <FormMessage kind="fault">{fault}</FormMessage>}
      <table className="table table-stacks">
        <thead>
          <tr>
            <th scope="col">Stage</th>
            <th scope="col">What</th>
            <th scope="col">Severity</th>
          </tr>
        </thead>
        <tbody>
          {listed.map((item, index) => (
            <tr key={`${keyOf(item)} ${index}`}>
              <th scope="row" className="wrap-anywhere">
                {item.stage === "" ? (
                  "Whole voice"
                ) : (
                  <a href={`/voices/${voiceId}/stages/${item.stage}`}>{names[item.stage]}</a>
                )}
              </th>
              <td className="gives">
                {item.message}
                {item.fromNeighbours && (
                  <span className="block text-small text-ink-2">
                    It comes from what the stage is linked to: alone, it is free of it.
                  </span>
                )}
                {item.accepted && (
                  <span className="block text-small text-ink-2">
                    Accepted by {item.accepted.by}: {item.accepted.reason}{" "}
                    {current && (
                      <button
                        type="button"
                        className="btn-text needs-js no-print"
                        onClick={() => void judge(item, undefined)}
                      >
                        Take back
                      </button>
                    )}
                  </span>
                )}
                {current &&
                  !item.accepted &&
                  item.severity !== "note" &&
                  (asking === keyOf(item) ? (
                    <AcceptForm
                      by={me}
                      onAccept={(accepted) => judge(item, accepted)}
                      onClose={() => setAsking(undefined)}
                    />
                  ) : (
                    <button
                      type="button"
                      className="btn-text needs-js no-print block text-small"
                      onClick={() => setAsking(keyOf(item))}
                    >
                      Accept it
                    </button>
                  ))}
              </td>
              <td>
                <StateMark state={marks[item.severity]} word={item.severity} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
