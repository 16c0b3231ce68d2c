import { formatQuantity, midSentence } from "#lib/circuit/index.ts";
import { stepFigure } from "#lib/client/stage/stepping.ts";
import { figureText, readFigure, readWindow, windowText } from "#lib/wire/figureText.ts";
import { FieldNote } from "./FieldNote.tsx";
import { QuantityInput } from "./QuantityInput.tsx";
import { SymbolText } from "./SymbolText.tsx";
import { TextWithSymbols } from "./TextWithSymbols.tsx";
import type { Stage } from "./useStage.ts";

const windowStep = 0.01;

/** What is wanted, each with the window that still counts as met. */
export function Targets({ stage, id, readOnly }: { stage: Stage; id: string; readOnly: boolean }) {
  const { topology, refusal } = stage;
  const entries = Object.entries(topology.targets);
  if (entries.length === 0)
    return <p className="text-ink-2">Nothing to aim at here: set the parts and read the results.</p>;
  return (
    <>
      {entries.map(([key]) => (
        <TargetField
          key={key}
          stage={stage}
          target={key}
          id={`${id}-${key}`}
          refusalId={`${id}-refusal`}
          readOnly={readOnly}
        />
      ))}
      <div id={`${id}-refusal`} aria-live="polite" className="target-refusal">
        {refusal && (
          <div className="fault">
            <strong>No parts give this.</strong> <TextWithSymbols text={refusal.message} /> The parts and results beside
            this stay as they are.
          </div>
        )}
      </div>
    </>
  );
}

interface TargetFieldProps {
  stage: Stage;
  target: string;
  id: string;
  refusalId: string;
  readOnly: boolean;
}

function TargetField({ stage, target, id, refusalId, readOnly }: TargetFieldProps) {
  const { topology, state, fields, actions, refusal } = stage;
  const field = topology.targets[target]!;
  const value = state.targets[target]!;
  const width = state.windows[target] ?? field.window;
  const refused = refusal?.field === target;
  const least = formatQuantity(value * (1 - width), field.unit);
  const most = formatQuantity(value * (1 + width), field.unit);
  return (
    <div className="field target">
      <label htmlFor={id}>
        {field.label}, <SymbolText symbol={field.symbol} />
      </label>
      <div className="field-box">
        <QuantityInput
          fields={fields}
          name={`targets.${target}`}
          id={id}
          read={(text) => readFigure(text, field)}
          print={(figure) => figureText(figure, field.unit)}
          step={(direction, count) => stepFigure(value, field, direction, count)}
          onValue={(figure) => actions.set("targets", target, figure)}
          describedBy={refused ? `${id}-note ${refusalId}` : `${id}-note`}
          refused={refused}
          readOnly={readOnly}
        />
        {field.unit !== "" && <span className="unit">{field.unit}</span>}
      </div>
      <p className="target-window">
        <label htmlFor={`${id}-window`}>
          window ±<span className="sr-only"> per cent, {midSentence(field.label)}</span>
        </label>
        <QuantityInput
          fields={fields}
          name={`windows.${target}`}
          id={`${id}-window`}
          className="input input-window"
          read={readWindow}
          print={windowText}
          step={(direction, count) =>
            Math.min(1, Math.max(0.001, Number((width + direction * count * windowStep).toFixed(4))))
          }
          onValue={(figure) => actions.set("windows", target, figure)}
          describedBy={`${id}-note`}
          readOnly={readOnly}
        />
        <span>
          %, {least} to {most}
        </span>
      </p>
      <FieldNote
        store={fields}
        fields={[
          { name: `targets.${target}`, inForce: formatQuantity(value, field.unit) },
          { name: `windows.${target}`, inForce: `± ${windowText(width)} %` },
        ]}
        id={`${id}-note`}
        hint={refused ? "No parts give this; the reason stands below." : field.help}
        refused={refused}
      />
    </div>
  );
}
