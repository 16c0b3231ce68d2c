import { formatQuantity } from "../../quantity/format.ts";
import { analyseStage, type Analysis } from "../../stage/analyse.ts";
import type { ComputedChain, ComputedStage } from "../compute.ts";
import { ownConditions } from "../computeStage.ts";
import type { CheckItem } from "./item.ts";

/** What each stage says of itself under its neighbours, and what it takes for granted. */
export function stageItems(computed: ComputedChain): CheckItem[] {
  return computed.chain.stages.flatMap((stage): CheckItem[] => {
    const found = computed.stages.get(stage.id);
    if (!found) {
      const message = `${stage.name}: this version of the library does not know its network, so it has no figures.`;
      return [{ severity: "fault", stage: stage.id, code: "unknown-network", message }];
    }
    return [...figureItems(found, computed), ...assumptionItems(found), ...settingItems(found, computed)];
  });
}

function figureItems(found: ComputedStage, { chain }: ComputedChain): CheckItem[] {
  const { analysis, stage } = found;
  const items = [...analysis.warnings.map((warning) => ({ stage: stage.id, ...warning })), ...targetItems(found)];
  if (items.length === 0 || Object.keys(found.decided).length === 0) return items;
  const alone = analyseStage(found.found.topology, {
    ...stage,
    conditions: ownConditions(stage, found.found, chain.conditions),
  });
  return items.map((item) => (arises(item, alone) ? item : { ...item, fromNeighbours: true }));
}

function targetItems({ stage, found: { topology }, analysis }: ComputedStage): CheckItem[] {
  return Object.entries(analysis.state).flatMap(([key, state]): CheckItem[] => {
    if (state !== "outside") return [];
    const field = topology.targets[key]!;
    const value = analysis.results[field.result];
    const wanted = stage.targets[key]!;
    const width = stage.windows?.[key] ?? field.window;
    const target = `the ${formatQuantity(wanted, field.unit)} wanted, ±${formatQuantity(100 * width, "")} %`;
    const common = { severity: "caution", stage: stage.id, code: `target-${key}` } as const;
    if (typeof value !== "number") return [{ ...common, message: `${field.label} has no value, against ${target}.` }];
    const message = `${field.label} is ${formatQuantity(value, field.unit)}, outside ${target}. Choose other parts, or widen the window.`;
    return [{ ...common, message, value, limit: wanted, unit: field.unit }];
  });
}

/** Whether the stage says it standing alone, too. */
function arises({ code }: CheckItem, alone: Analysis): boolean {
  if (code.startsWith("target-")) return alone.state[code.slice("target-".length)] === "outside";
  return alone.warnings.some((warning) => warning.code === code);
}

/** Figures of devices that stand at what such devices usually have: nobody has looked them up or measured them yet. */
function assumptionItems({ stage, found: { topology }, conditions, decided }: ComputedStage): CheckItem[] {
  const taken = Object.entries(topology.conditions).flatMap(([key, field]) => {
    if (field.type !== "number" || field.suggestion === undefined || key in decided) return [];
    return conditions[key] === field.suggestion
      ? [`${field.label} ${formatQuantity(field.suggestion, field.unit)}`]
      : [];
  });
  if (taken.length === 0) return [];
  const message = `Taken as typical: ${taken.join("; ")}. Measure, or read the data sheet of the part in hand.`;
  return [{ severity: "note", stage: stage.id, code: "typical-figures", message }];
}

function settingItems({ stage, found: { topology } }: ComputedStage, { unsettled }: ComputedChain): CheckItem[] {
  const items: CheckItem[] = [];
  if (stage.apart) {
    const message = "Taken out of the chain's influence: its figures are those of the stage alone.";
    items.push({ severity: "note", stage: stage.id, code: "set-apart", message });
  }
  const counted = (stage.notFitted ?? []).filter((key) => (stage.parts[key] ?? 0) > 0);
  if (counted.length > 0) {
    const names = counted.map((key) => stage.designators[key] ?? topology.parts[key]!.label);
    const message = `Marked as not fitted, though the figures count on it: ${names.join(", ")}.`;
    items.push({ severity: "caution", stage: stage.id, code: "not-fitted", message });
  }
  if (unsettled.includes(stage.id)) {
    const message =
      "Its load and its signal chase each other and come to no rest; the figures are those of the last round.";
    items.push({ severity: "fault", stage: stage.id, code: "unsettled", message });
  }
  return items;
}
