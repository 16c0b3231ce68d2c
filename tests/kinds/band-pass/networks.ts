import {
  completeConditions,
  potFraction,
  type AnyTopology,
  type PlainConditions,
  type PlainValues,
  type PotLaw,
} from "#lib/circuit/index.ts";
import { bandPass } from "#lib/circuit/kinds/band-pass/index.ts";
import { transferAt as bridgedT } from "#lib/circuit/kinds/band-pass/topologies/bridged-t/analyse.ts";
import { transferAt as multipleFeedback } from "#lib/circuit/kinds/band-pass/topologies/multiple-feedback/analyse.ts";
import { transferOf as passive } from "#lib/circuit/kinds/band-pass/topologies/passive/model.ts";
import { transferAt as sallenKey } from "#lib/circuit/kinds/band-pass/topologies/sallen-key/analyse.ts";
import { outputsAt } from "#lib/circuit/kinds/band-pass/topologies/two-integrator/analyse.ts";
import type { Transfer } from "#lib/circuit/network/transfer.ts";
import { netListOf, nodalTransfer, withSource, type Element } from "../../support/nodal.ts";

export const topologyOf = (id: string): AnyTopology => bandPass.topologies.find((topology) => topology.id === id)!;

type Untyped = never;

/** The library's own transfer functions by topology. */
export const transfers: Record<string, (state: { parts: PlainValues; conditions: PlainConditions }) => Transfer> = {
  "multiple-feedback": (state) => multipleFeedback(state as Untyped),
  "sallen-key": (state) => sallenKey(state as Untyped),
  "two-integrator": (state) => outputsAt(state as Untyped).bandPass,
  "bridged-t": (state) => bridgedT(state as Untyped),
  passive: ({ parts, conditions }) => passive(parts as Untyped, conditions as Untyped),
};

/** V(output)/V(source) of a topology's drawn network by nodal analysis, under the given conditions. */
export function nodalResponse(topology: AnyTopology, parts: PlainValues, given: PlainConditions = {}, output = "o") {
  const conditions = completeConditions(topology, given) as Record<string, number | null> & { potLaw?: PotLaw };
  const inCircuit = potFraction(conditions.potLaw ?? "linear", conditions["rotation"] ?? 0);
  const second = 10 ** ((conditions["gangMismatch"] ?? 0) / 20);
  const values = Object.fromEntries(
    Object.entries(parts).map(([key, value]) => {
      if (!key.endsWith("Pot")) return [key, value];
      return [key, value * inCircuit * (key === "r2Pot" ? second : 1)];
    }),
  );
  const drawn = netListOf(topology.network, values, {
    gainBandwidth: conditions["gainBandwidth"] ?? null,
    openLoopGain: conditions["openLoopGain"] ?? null,
    outputResistance: conditions["outputResistance"] ?? 0,
  });
  const beside = (value: number | null | undefined, nodes: [string, string]): Element[] =>
    value === null || value === undefined ? [] : [{ kind: "resistor", nodes, value }];
  const elements = [
    ...drawn,
    ...beside(conditions["loadResistance"], [output, "0"]),
    ...beside(conditions["leakageResistance"], ["o", "m"]),
  ];
  return nodalTransfer(withSource(elements, "in", "source", conditions["sourceResistance"]!), "source", output);
}
