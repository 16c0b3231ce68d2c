import {
  completeConditions,
  potFraction,
  type PlainConditions,
  type PlainValues,
  type PotLaw,
} from "#lib/circuit/index.ts";
import { multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/index.ts";
import { netListOf, nodalTransfer, withSource, type Element } from "../../support/nodal.ts";

/** V(out)/V(source) of the drawn network by nodal analysis, under the given conditions. */
export function nodalResponse(parts: PlainValues, given: PlainConditions = {}) {
  const conditions = completeConditions(multipleFeedback, given) as Record<string, number | null> & { potLaw: PotLaw };
  const rheostat = parts["rbPot"]! * potFraction(conditions.potLaw, conditions["rotation"]!);
  const drawn = netListOf(
    multipleFeedback.network,
    { ...parts, rbPot: rheostat },
    {
      gainBandwidth: conditions["gainBandwidth"]!,
      openLoopGain: conditions["openLoopGain"]!,
      outputResistance: conditions["outputResistance"]!,
    },
  );
  const load: Element[] =
    conditions["loadResistance"] === null
      ? []
      : [{ kind: "resistor", nodes: ["o", "0"], value: conditions["loadResistance"]! }];
  return nodalTransfer(withSource([...drawn, ...load], "in", "source", conditions["sourceResistance"]!), "source", "o");
}
