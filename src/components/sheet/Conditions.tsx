import { useState } from "react";
import {
  acceptedRange,
  formatQuantity,
  type ChoiceField,
  type ConditionField,
  type NumberField,
} from "#lib/circuit/index.ts";
import { stepFigure } from "#lib/client/stage/stepping.ts";
import { figureText, readFigure } from "#lib/wire/figureText.ts";
import { isOptional } from "#lib/wire/stageState.ts";
import { FieldNote } from "./FieldNote.tsx";
import { QuantityInput } from "./QuantityInput.tsx";
import { ShareSlider } from "./ShareSlider.tsx";
import { SymbolText } from "./SymbolText.tsx";
import type { Stage } from "./useStage.ts";

interface ConditionsProps {
  stage: Stage;
  id: string;
  readOnly: boolean;
}

/** A share from 0 to 1 is turned, not typed. */
const isShare = (field: ConditionField): field is NumberField => {
  if (field.type !== "number" || field.scale !== "linear" || field.default === null) return false;
  const [least, most] = acceptedRange(field);
  return least === 0 && most === 1;
};

/** What the stage works under: what is turned, what surrounds it once switched on, and the rest. */
export function Conditions({ stage, id, readOnly, only }: ConditionsProps & { only?: "turned" }) {
  const { topology, state } = stage;
  const entries = Object.entries(topology.conditions).filter(
    ([key, { ofPart, ...field }]) =>
      // One that was set by itself stays in sight, or nobody would find what it does.
      ofPart === undefined || state.parts[ofPart]! > 0 || state.conditions[key] !== field.default,
  );
  const shares = entries.filter((entry): entry is [string, NumberField] => isShare(entry[1]));
  const optional = entries.filter(
    (entry): entry is [string, NumberField] => isOptional(entry[1]) && !isShare(entry[1]),
  );
  const others = entries.filter(([, field]) => !isShare(field) && !isOptional(field));
  const changed = others.filter(([key, field]) => stage.state.conditions[key] !== field.default).length;
  return (
    <>
      {shares.map(([key, field]) => (
        <ShareSlider key={key} stage={stage} condition={key} field={field} id={`${id}-${key}`} readOnly={readOnly} />
      ))}
      {only === undefined && optional.length > 0 && (
        <fieldset className="surroundings">
          <legend>Surroundings</legend>
          {optional.map(([key, field]) => (
            <Surrounding
              key={key}
              stage={stage}
              condition={key}
              field={field}
              id={`${id}-${key}`}
              readOnly={readOnly}
            />
          ))}
        </fieldset>
      )}
      {only === undefined && others.length > 0 && (
        <details className="more-conditions">
          <summary>
            More conditions<span className="dim">{changed > 0 ? `, ${changed} changed` : `, ${others.length}`}</span>
          </summary>
          {others.map(([key, field]) =>
            field.type === "choice" ? (
              <Choice key={key} stage={stage} condition={key} field={field} id={`${id}-${key}`} readOnly={readOnly} />
            ) : (
              <div className="field" key={key}>
                <label htmlFor={`${id}-${key}`}>
                  <Named field={field} />
                </label>
                <Figure stage={stage} condition={key} field={field} id={`${id}-${key}`} readOnly={readOnly} />
              </div>
            ),
          )}
        </details>
      )}
    </>
  );
}

interface ConditionProps<F> extends ConditionsProps {
  condition: string;
  field: F;
}

function Named({ field }: { field: ConditionField }) {
  if (field.symbol === "") return field.label;
  return (
    <>
      {field.label}, <SymbolText symbol={field.symbol} />
    </>
  );
}

function Figure({ stage, condition, field, id, readOnly }: ConditionProps<NumberField>) {
  const { fields, state, actions } = stage;
  const value = state.conditions[condition];
  const figure = typeof value === "number" ? value : (field.suggestion ?? field.least);
  return (
    <>
      <div className="field-box">
        <QuantityInput
          fields={fields}
          name={`conditions.${condition}`}
          id={id}
          read={(text) => readFigure(text, field)}
          print={(next) => figureText(next, field.unit)}
          step={(direction, count) => stepFigure(figure, field, direction, count)}
          onValue={(next) => actions.setCondition(condition, next)}
          describedBy={`${id}-note`}
          readOnly={readOnly}
        />
        {field.unit !== "" && <span className="unit">{field.unit}</span>}
      </div>
      <FieldNote
        store={fields}
        fields={[{ name: `conditions.${condition}`, inForce: formatQuantity(figure, field.unit) }]}
        id={`${id}-note`}
        hint={field.help}
      />
    </>
  );
}

/** Absent from an ideal world until its box is ticked; then its usual figure is offered. */
function Surrounding({ stage, condition, field, id, readOnly }: ConditionProps<NumberField>) {
  const { fields, actions } = stage;
  // Not read off the figure: on its way to 0.5k the field holds the 0 that stands for an ideal world.
  const [on, setOn] = useState((stage.state.conditions[condition] ?? null) !== field.default);
  const toggle = (next: boolean) => {
    setOn(next);
    const offered = next ? (field.suggestion ?? field.least) : field.default;
    fields.set(`conditions.${condition}`, offered === null ? "" : figureText(offered, field.unit));
    actions.setCondition(condition, offered);
  };
  return (
    <div className="surrounding">
      <label className="choice" htmlFor={`${id}-on`}>
        <input
          id={`${id}-on`}
          type="checkbox"
          checked={on}
          disabled={readOnly}
          onChange={(event) => toggle(event.target.checked)}
        />
        <span>
          <Named field={field} />
        </span>
      </label>
      {on && (
        <div className="field">
          <label className="sr-only" htmlFor={id}>
            {field.label}, value
          </label>
          <Figure stage={stage} condition={condition} field={field} id={id} readOnly={readOnly} />
        </div>
      )}
    </div>
  );
}

function Choice({ stage, condition, field, id, readOnly }: ConditionProps<ChoiceField>) {
  return (
    <div className="field">
      <label htmlFor={id}>
        <Named field={field} />
      </label>
      <select
        id={id}
        className="input"
        value={String(stage.state.conditions[condition])}
        disabled={readOnly}
        onChange={(event) => stage.actions.setCondition(condition, event.target.value)}
      >
        {field.options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
      <p className="field-note">{field.help}</p>
    </div>
  );
}
