import { useId, useState } from "react";
import { formatQuantity } from "#lib/circuit/index.ts";
import { portsOf, type ChainLink, type ComputedChain } from "#lib/circuit/voice/index.ts";
import { withStageApart, withStageDoubled, withoutLink } from "#lib/client/voice/stageEdits.ts";
import type { Library } from "#lib/client/voice/useLibrary.ts";
import { withoutStage, type StoredStage, type WorkingCopyDocument } from "#lib/client/workingCopy.ts";
import { Warnings } from "../sheet/Warnings.tsx";

interface StagePanelProps {
  voiceId: string;
  stage: StoredStage;
  computed: ComputedChain;
  library: Library;
  editable: boolean;
  onAct: (edit: (document: WorkingCopyDocument) => WorkingCopyDocument, done: string) => void;
  onLink: (ends: Pick<ChainLink, "from" | "to">) => void;
  onClose: () => void;
}

/** The chosen stage: what the chain makes of it, what it is linked to, and what can be done with it. */
export function StagePanel({ voiceId, stage, computed, library, editable, onAct, onLink, onClose }: StagePanelProps) {
  const found = computed.stages.get(stage.id);
  if (!found) return null;
  const { topology, kind } = found.found;
  const nameOf = (id: string) => computed.stages.get(id)?.stage.name ?? id;
  const labelOf = (id: string, port: string) =>
    computed.stages.get(id)?.found.kind.ports.find((one) => one.id === port)?.label ?? port;
  const mine = computed.chain.links.filter(({ from, to }) => from.stage === stage.id || to.stage === stage.id);
  const decided = Object.entries(found.decided);
  return (
    <section className="chain-panel" aria-label={stage.name}>
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <h2 className="wrap-anywhere text-body">{stage.name}</h2>
        <span className="text-small text-ink-2">
          {kind.name}, {topology.name.toLocaleLowerCase("en")}
        </span>
        <span className="ml-auto flex flex-wrap gap-2">
          <a className="btn" href={`/voices/${voiceId}/stages/${stage.id}`}>
            Open its sheet
          </a>
          {editable && (
            <>
              <button
                type="button"
                className="btn"
                onClick={() =>
                  onAct((now) => withStageDoubled(now, stage.id, library.find), `${stage.name} was doubled.`)
                }
              >
                Duplicate
              </button>
              <button
                type="button"
                className="btn"
                onClick={() => {
                  onAct((now) => withoutStage(now, stage.id), `${stage.name} was removed; Undo brings it back.`);
                  onClose();
                }}
              >
                Remove
              </button>
            </>
          )}
          <button type="button" className="btn" onClick={onClose}>
            Close
          </button>
        </span>
      </div>
      <div className="chain-panel-cols">
        <div>
          <h3 className="text-small text-ink-2">Linked to</h3>
          {mine.length === 0 && <p className="text-ink-2">Nothing yet.</p>}
          <ul>
            {mine.map(({ id, from, to }) => {
              const out = from.stage === stage.id;
              const [own, other] = out ? [from, to] : [to, from];
              return (
                <li key={id}>
                  {labelOf(stage.id, own.port)} {out ? "feeds" : "from"} {nameOf(other.stage)},{" "}
                  {labelOf(other.stage, other.port)}{" "}
                  {editable && (
                    <button
                      type="button"
                      className="btn-text text-small"
                      aria-label={`Unlink ${labelOf(stage.id, own.port)} and ${nameOf(other.stage)}`}
                      onClick={() => onAct((now) => withoutLink(now, id), "Unlinked.")}
                    >
                      Unlink
                    </button>
                  )}
                </li>
              );
            })}
          </ul>
          {editable && <AddLink stage={stage} computed={computed} onLink={onLink} />}
        </div>
        <div>
          <h3 className="text-small text-ink-2">What the chain decides</h3>
          {decided.length === 0 && (
            <p className="text-ink-2">{stage.apart ? "Nothing: it is taken out of its influence." : "Nothing."}</p>
          )}
          <ul>
            {decided.map(([key, { value }]) => {
              const field = topology.conditions[key]!;
              const text =
                field.type === "choice"
                  ? (field.options.find((option) => option.value === value)?.label ?? String(value))
                  : value === null
                    ? "none"
                    : formatQuantity(value as number, field.unit);
              return (
                <li key={key}>
                  {field.label} <span className="fig">{text}</span>
                </li>
              );
            })}
          </ul>
          {editable && (
            <label className="mt-2 flex items-center gap-2">
              <input
                type="checkbox"
                checked={stage.apart ?? false}
                onChange={(event) => {
                  const apart = event.target.checked;
                  onAct(
                    (now) => withStageApart(now, stage.id, apart),
                    apart
                      ? `${stage.name} shows its ideal self.`
                      : `${stage.name} is under the chain's influence again.`,
                  );
                }}
              />
              Take it out of the chain&apos;s influence
            </label>
          )}
        </div>
      </div>
      <Warnings warnings={found.analysis.warnings} />
    </section>
  );
}

interface AddLinkProps {
  stage: StoredStage;
  computed: ComputedChain;
  onLink: (ends: Pick<ChainLink, "from" | "to">) => void;
}

/** Links without a pointer: from a port of this stage to a fitting one of another. */
function AddLink({ stage, computed, onLink }: AddLinkProps) {
  const id = useId();
  const [wanted, setWanted] = useState("");
  const own = portsOf(computed.stages.get(stage.id)!.found);
  const choices = [...computed.stages].flatMap(([otherId, other]) =>
    otherId === stage.id
      ? []
      : portsOf(other.found).flatMap((port) =>
          own
            .filter(({ sort, direction }) => sort === port.sort && direction !== port.direction)
            .map((mine) => {
              const ends = [
                { stage: stage.id, port: mine.id },
                { stage: otherId, port: port.id },
              ] as const;
              const [from, to] = mine.direction === "out" ? ends : ([ends[1], ends[0]] as const);
              const taken = computed.wiring.sourceOf(to.stage, to.port) !== undefined;
              return {
                from,
                to,
                taken,
                text: `${mine.label} ${mine.direction === "out" ? "to" : "from"} ${other.stage.name}, ${port.label}`,
              };
            }),
        ),
  );
  const free = choices.filter(({ taken }) => !taken);
  if (free.length === 0) return null;
  return (
    <div className="field mt-2">
      <label htmlFor={id}>Link</label>
      <div className="flex flex-wrap gap-2">
        <select
          id={id}
          className="input min-w-0 flex-1"
          value={wanted}
          onChange={(event) => setWanted(event.target.value)}
        >
          <option value="">Choose a port</option>
          {free.map(({ text }, index) => (
            <option key={text + String(index)} value={index}>
              {text}
            </option>
          ))}
        </select>
        <button
          type="button"
          className="btn"
          aria-disabled={wanted === ""}
          onClick={() => {
            const choice = free[Number(wanted)];
            if (wanted === "" || !choice) return;
            onLink({ from: choice.from, to: choice.to });
            setWanted("");
          }}
        >
          Link them
        </button>
      </div>
    </div>
  );
}
