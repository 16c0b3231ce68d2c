import type { Port } from "../../stage/kind.ts";
import { portsOf, type FindTopology } from "../chain.ts";
import type { ComputedChain, ComputedStage } from "../compute.ts";
import { designatorFaults } from "../designate.ts";
import type { CheckItem } from "./item.ts";

/** Ports that lead nowhere. A voice of one stage is a sketch, and has none to lead to. */
export function portItems(computed: ComputedChain): CheckItem[] {
  if (computed.chain.stages.length < 2) return [];
  return [...computed.stages.values()].flatMap((found): CheckItem[] => {
    const open = portsOf(found.found).filter((port) => isOpen(port, found, computed));
    if (open.length === 0) return [];
    const inputs = open.some(({ direction }) => direction === "in");
    const message = `Not linked: ${open.map(({ label }) => label).join(", ")}. ${inputs ? "The stage keeps its own assumptions there." : "Nothing takes what it gives."}`;
    return [{ severity: "note", stage: found.stage.id, code: "unlinked-port", message }];
  });
}

function isOpen(port: Port, { stage, found: { topology } }: ComputedStage, { wiring, stages }: ComputedChain): boolean {
  if (port.jack || port.mayStayOpen) return false;
  const { conditions } = stages.get(stage.id)!;
  if (topology.joints?.[port.id]?.fitted?.({ parts: stage.parts, conditions }) === false) return false;
  const replaced = Object.entries(topology.joints ?? {}).some(
    ([id, { insteadOf }]) => insteadOf === port.id && wiring.sourceOf(stage.id, id) !== undefined,
  );
  if (replaced) return false;
  return port.direction === "in"
    ? wiring.sourceOf(stage.id, port.id) === undefined
    : wiring.fedBy(stage.id, port.id).length === 0;
}

/** A link into a path that has no resistor, say. */
export function unfittedItems({ chain, stages, wiring }: ComputedChain): CheckItem[] {
  return [...stages.values()].flatMap(({ stage, found: { topology, kind }, conditions }): CheckItem[] => {
    const missing = kind.ports.filter(
      ({ id }) =>
        topology.joints?.[id]?.fitted?.({ parts: stage.parts, conditions }) === false &&
        chain.links.some(({ to }) => to.stage === stage.id && to.port === id) &&
        wiring.sourceOf(stage.id, id),
    );
    return missing.map(({ id, label }) => ({
      ...{ severity: "caution", stage: stage.id, code: `unfitted-${id}` },
      message: `A link leads to ${label}, whose part is not fitted: nothing comes in there.`,
    }));
  });
}

/** Designators that are given twice, left out or missing. */
export function designatorItems({ chain }: ComputedChain, find: FindTopology): CheckItem[] {
  const { duplicates, gaps, missing } = designatorFaults(chain.stages, find);
  const items: CheckItem[] = duplicates.map(({ designator, places }) => ({
    ...{ severity: "fault", stage: places[1]!.stage, code: `duplicate-${designator}` },
    message: `${designator} is given ${places.length} times. Each part needs one of its own.`,
  }));
  if (missing.length > 0) {
    const message = `${missing.length === 1 ? "One part has" : `${missing.length} parts have`} no designator yet. The parts list gives them on request.`;
    items.push({ severity: "note", stage: "", code: "designators-missing", message });
  }
  if (gaps.length > 0) {
    const message = `Numbers left out: ${gaps.join(", ")}.`;
    items.push({ severity: "note", stage: "", code: "designator-gaps", message });
  }
  return items;
}
