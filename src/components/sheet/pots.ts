import type { AnyTopology, PlainValues } from "#lib/circuit/index.ts";

/** Degrees of electrical travel, said by the axis of whichever curve runs over the rotation. */
export function fullTurn(topology: AnyTopology): number | undefined {
  return topology.curves.find(({ x }) => x.shown?.unit === "°")?.x.shown?.factor;
}

/** False only where the topology has pots and every one is left out. */
export function anyPotFitted(topology: AnyTopology, parts: PlainValues): boolean {
  const pots = Object.entries(topology.parts).filter(([, { partClass }]) => partClass === "pot");
  return pots.length === 0 || pots.some(([key]) => parts[key]! > 0);
}
