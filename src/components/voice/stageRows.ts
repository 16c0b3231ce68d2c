import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { analyseStage, printQuantity, type TargetState } from "#lib/circuit/index.ts";
import type { StoredStage } from "#lib/client/workingCopy.ts";
import type { FigureState } from "../page/StateMark.tsx";
import type { StageRow } from "./StageList.tsx";

const severity: Record<TargetState, number> = { within: 0, close: 1, outside: 2 };

/** The worst of the targets' states speaks for the stage. */
function stateOf(states: Record<string, TargetState>): FigureState {
  const worst = Object.values(states).sort((a, b) => severity[b] - severity[a])[0];
  return worst ?? "unknown";
}

const designatorOrder = new Intl.Collator("en", { numeric: true }).compare;

/** One stage as a list shows it: its two most telling figures, its state, its designators. */
export function stageRow(stage: StoredStage): StageRow {
  const designators = Object.values(stage.designators).sort(designatorOrder);
  const kind = stageKinds.find(({ id }) => id === stage.kind);
  const topology = kind?.topologies.find(({ id }) => id === stage.topology);
  if (!kind || !topology) {
    const network = `${stage.kind}, ${stage.topology}: this version does not know it`;
    return { id: stage.id, name: stage.name, network, figures: [], state: "unknown", designators };
  }
  const { results, state } = analyseStage(topology, stage);
  const figures = kind.telling.flatMap((key) => {
    const field = topology.results[key];
    const value = results[key];
    if (!field || typeof value !== "number") return [];
    const { figure, unit } = printQuantity(value, field.unit);
    return [{ label: field.label, value: figure, unit }];
  });
  const network = stage.name === kind.name ? topology.name : `${kind.name}, ${topology.name.toLocaleLowerCase("en")}`;
  return { id: stage.id, name: stage.name, network, figures, state: stateOf(state), designators };
}
