import type { NumberField } from "#lib/circuit/index.ts";
import { anyPotFitted, fullTurn } from "./pots.ts";
import type { Stage } from "./useStage.ts";

interface ShareSliderProps {
  stage: Stage;
  condition: string;
  field: NumberField;
  id: string;
  readOnly?: boolean;
}

/** A share from 0 to 1, shown in degrees where a curve of the topology shows it so. */
export function ShareSlider({ stage, condition, field, id, readOnly = false }: ShareSliderProps) {
  const value = stage.state.conditions[condition];
  const share = typeof value === "number" ? value : (field.default ?? 0);
  const turn = fullTurn(stage.topology);
  const idle = !anyPotFitted(stage.topology, stage.state.parts);
  const shown = turn === undefined ? `${Math.round(share * 100)} %` : `${Math.round(share * turn)}° of ${turn}°`;
  return (
    <div className="field">
      <label htmlFor={id}>{field.label}</label>
      <input
        id={id}
        type="range"
        min={0}
        max={1}
        step={turn === undefined ? 0.01 : 1 / turn}
        value={share}
        disabled={idle || readOnly}
        aria-valuetext={shown}
        aria-describedby={`${id}-note`}
        onChange={(event) => stage.actions.setCondition(condition, Number(Number(event.target.value).toFixed(4)))}
      />
      <p id={`${id}-note`} className="field-note">
        {idle ? "No pot is fitted: give it a value to turn it." : shown}
      </p>
    </div>
  );
}
