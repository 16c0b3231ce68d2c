import { useState, type SyntheticEvent } from "react";
import { acceptedRange, formatQuantity, formatTyped, parseQuantity, type ConditionField } from "#lib/circuit/index.ts";
import { voiceConditions } from "#lib/circuit/voice/index.ts";
import { saveFailure } from "#lib/client/saveFailure.ts";
import { changeWorkingCopy, type WorkingCopy } from "#lib/client/workingCopy.ts";
import { FormMessage } from "../forms/FormMessage.tsx";

interface VoiceConditionsProps {
  voiceId: string;
  conditions: Record<string, number | string>;
  /** For who may change them. */
  copy: WorkingCopy | null;
}

const fields: [string, ConditionField][] = Object.entries(voiceConditions);

function textOf(field: ConditionField, value: number | string | undefined): string {
  const known = value ?? field.default;
  if (field.type === "choice") return String(known);
  return typeof known === "number" ? formatTyped(known, field.unit) : "";
}

/** What is wrong with what was typed; undefined where nothing is. */
function faultOf(field: ConditionField, text: string): string | undefined {
  if (field.type === "choice" || (text.trim() === "" && field.default === null)) return undefined;
  const read = parseQuantity(text);
  if (!read.ok) return read.reason;
  const [least, most] = acceptedRange(field);
  if (read.value >= least && read.value <= most) return undefined;
  return `Give ${formatQuantity(least, field.unit)} to ${formatQuantity(most, field.unit)}.`;
}

/** What holds for the whole voice: rails, temperature, and what stands between board and supply. */
export function VoiceConditions({ voiceId, conditions, copy }: VoiceConditionsProps) {
  const [texts, setTexts] = useState(() =>
    Object.fromEntries(fields.map(([key, field]) => [key, textOf(field, conditions[key])])),
  );
  const [faults, setFaults] = useState<Record<string, string>>({});
  const [failure, setFailure] = useState<string>();
  const send = async (event: SyntheticEvent) => {
    event.preventDefault();
    if (!copy) return;
    const found = fields.flatMap(([key, field]) => {
      const fault = faultOf(field, texts[key]!);
      return fault === undefined ? [] : [[key, fault] as const];
    });
    setFaults(Object.fromEntries(found));
    if (found.length > 0) return document.getElementById(`voice-${found[0]![0]}`)?.focus();
    const wanted = Object.fromEntries(
      fields.flatMap(([key, field]): [string, number | string][] => {
        const text = texts[key]!;
        if (text === textOf(field, undefined)) return [];
        if (field.type === "choice") return [[key, text]];
        const read = parseQuantity(text);
        return read.ok ? [[key, read.value]] : [];
      }),
    );
    const outcome = await changeWorkingCopy(voiceId, copy, (saved) => {
      const others = Object.entries(saved.conditions).filter(([key]) => !(key in voiceConditions));
      return { ...saved, conditions: { ...Object.fromEntries(others), ...wanted } };
    });
    if (outcome.kind === "saved") return window.location.reload();
    setFailure(saveFailure(outcome));
  };
  return (
    <form noValidate onSubmit={(event) => void send(event)} className="voice-conditions">
      {failure !== undefined && <FormMessage kind="fault">{failure}</FormMessage>}
      {fields.map(([key, field]) => (
        <div key={key} className="field">
          <label htmlFor={`voice-${key}`}>{field.label}</label>
          {field.type === "choice" ? (
            <select
              id={`voice-${key}`}
              className="input"
              disabled={!copy}
              value={texts[key]}
              onChange={(event) => setTexts({ ...texts, [key]: event.target.value })}
            >
              {field.options.map(({ value, label }) => (
                <option key={value} value={value}>
                  {label}
                </option>
              ))}
            </select>
          ) : (
            <div className="field-box">
              <input
                id={`voice-${key}`}
                className="input"
                disabled={!copy}
                inputMode="decimal"
                autoComplete="off"
                value={texts[key]}
                placeholder={field.default === null ? "not given" : undefined}
                aria-invalid={key in faults || undefined}
                aria-describedby={`voice-${key}-note`}
                onChange={(event) => setTexts({ ...texts, [key]: event.target.value })}
              />
              <span className="unit">{field.unit}</span>
            </div>
          )}
          <p id={`voice-${key}-note`} className={key in faults ? "field-note error" : "field-note"}>
            {faults[key]}
          </p>
        </div>
      ))}
      {copy && (
        <button type="submit" className="btn btn-primary needs-js">
          Save
        </button>
      )}
    </form>
  );
}
