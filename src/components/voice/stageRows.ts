import { printQuantity, type TargetState } from "#lib/circuit/index.ts";
import type { ChainStage, ComputedChain, ComputedStage } from "#lib/circuit/voice/index.ts";
import type { FigureState } from "../page/StateMark.tsx";
import type { StageRow } from "./StageList.tsx";

const severity: Record<TargetState, number> = { within: 0, close: 1, outside: 2 };

/** The worst of the targets' states speaks for the stage; a fault goes before them all. */
function stateOf({ analysis: { state, warnings } }: ComputedStage): FigureState {
  if (warnings.some((warning) => warning.severity === "fault")) return "outside";
  return Object.values(state).sort((a, b) => severity[b] - severity[a])[0] ?? "unknown";
}

const designatorOrder = new Intl.Collator("en", { numeric: true }).compare;

/** The stages of a voice as a list shows them: two most telling figures, state, designators. */
export function rowsOfChain(computed: ComputedChain): StageRow[] {
  return computed.chain.stages.map((stage) => rowOf(stage, computed.stages.get(stage.id)));
}

function rowOf(stage: ChainStage, found: ComputedStage | undefined): StageRow {
  const common = {
    ...{ id: stage.id, name: stage.name },
    designators: Object.values(stage.designators).sort(designatorOrder),
  };
  if (!found) {
    const network = `${stage.kind}, ${stage.topology}: this version does not know it`;
    return { ...common, network, figures: [], state: "unknown" };
  }
  const { kind, topology } = found.found;
  const figures = kind.telling.flatMap((key) => {
    const field = topology.results[key];
    const value = found.analysis.results[key];
    if (!field || typeof value !== "number") return [];
    const { figure, unit } = printQuantity(value, field.unit);
    return [{ label: field.label, value: figure, unit }];
  });
  const network = stage.name === kind.name ? topology.name : `${kind.name}, ${topology.name.toLocaleLowerCase("en")}`;
  return { ...common, network, figures, state: stateOf(found) };
}
