import { formatQuantity } from "../quantity/format.ts";
import type { NumberField, PartClass } from "./fields.ts";
import { completeConditions, type PlainConditions, type PlainValues } from "./defaults.ts";
import { formatShown } from "./shown.ts";
import { targetWindows, targetStates, type TargetState, type Windows } from "./targets.ts";
import type { AnyTopology, Limit } from "./topology.ts";
import type { Conditions, Parts, ResultValues, Results } from "./values.ts";
import type { Warning } from "./warning.ts";

export interface Analysis {
  results: Record<string, number | readonly number[]>;
  warnings: Warning[];
  /** How each given target is met; empty without targets. */
  state: Record<string, TargetState>;
}

export interface AnalysisRequest {
  parts: PlainValues;
  conditions?: PlainConditions;
  targets?: PlainValues;
  /** Relative half-widths that replace the usual windows. */
  windows?: PlainValues;
}

/**
 * Results, warnings and the state of each target for one stage.
 *
 * @param request parts complete, every value within what its descriptor accepts (checked at the edge)
 */
export function analyseStage(topology: AnyTopology, request: AnalysisRequest): Analysis {
  const parts = request.parts;
  const conditions = completeConditions(topology, request.conditions);
  const raw = topology.analyse({ parts, conditions: conditions as never }, request.targets);
  const results: Analysis["results"] = {};
  const warnings: Warning[] = [];
  for (const key in raw) {
    const value = raw[key];
    if (value === undefined) continue;
    if (isFiniteResult(value)) results[key] = value;
    else warnings.push(undefinedResult(topology, key));
  }
  const windows = targetWindows(topology, request.targets ?? {}, request.windows);
  unusualValues(topology, parts, conditions, warnings);
  crossedLimits(topology, { parts, conditions, results, windows }, warnings);
  return { results, warnings: bySeverity(warnings), state: targetStates(topology, results, windows) };
}

function isFiniteResult(value: number | readonly number[]): boolean {
  return typeof value === "number" ? Number.isFinite(value) : value.every(Number.isFinite);
}

function undefinedResult(topology: AnyTopology, key: string): Warning {
  const label = topology.results[key]?.label ?? key;
  return {
    code: "no-figure",
    severity: "fault",
    message: `${label} has no finite value with these parts. Go back to the last values that gave a figure, or move towards the usual ones.`,
    value: 0,
    limit: 0,
    unit: "",
  };
}

function crossedLimits(
  topology: AnyTopology,
  context: { parts: PlainValues; conditions: PlainConditions; results: Analysis["results"]; windows: Windows },
  warnings: Warning[],
): void {
  const checked = context as typeof context & { conditions: never; results: ResultValues<Results> };
  for (const limit of topology.limits as readonly Limit<Parts, Conditions, Results>[]) {
    const found = limit.check(checked);
    if (!found) continue;
    const message = limit.template
      .replaceAll("{value}", formatShown(found.value, limit))
      .replaceAll("{limit}", formatShown(found.limit, limit))
      .replaceAll("{detail}", found.detail ?? "");
    const { code, severity, unit } = limit;
    warnings.push({ code, severity, message, value: found.value, limit: found.limit, unit });
  }
}

/** Values outside what the trade uses are computed all the same, and said. Plain loops: this runs on every analysis. */
function unusualValues(
  topology: AnyTopology,
  parts: PlainValues,
  conditions: PlainConditions,
  warnings: Warning[],
): void {
  for (const key in topology.parts) {
    const field = topology.parts[key]!;
    checkUsual(field, parts[key], warnings, () => `${partWords[field.partClass]} ${field.symbol} (${field.label})`);
  }
  for (const key in topology.conditions) {
    const field = topology.conditions[key]!;
    const value = conditions[key];
    if (field.type === "number" && typeof value === "number") checkUsual(field, value, warnings, () => field.label);
  }
}

/** A hair of room, so that a value at the limit is not called beyond it for the rounding of its last digit. */
const hair = 1e-9;

const partWords: Record<PartClass, string> = { resistor: "Resistor", capacitor: "Capacitor", pot: "Pot" };

function checkUsual(field: NumberField, value: number | undefined, warnings: Warning[], named: () => string): void {
  if (value === undefined) return;
  const least = field.least - Math.abs(field.least) * hair;
  const most = field.most + Math.abs(field.most) * hair;
  if (value >= least && value <= most) return;
  const limit = value < least ? field.least : field.most;
  const side = value < least ? "below" : "above";
  const message = `${named()}: ${formatQuantity(value, field.unit)} is ${side} the usual ${formatQuantity(limit, field.unit)}. It is computed as it is; check that it is meant.`;
  warnings.push({ code: "outside-usual-range", severity: "note", message, value, limit, unit: field.unit });
}

const order = { fault: 0, caution: 1, note: 2 };
const bySeverity = (warnings: Warning[]) => warnings.sort((a, b) => order[a.severity] - order[b.severity]);
