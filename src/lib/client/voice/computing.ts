import { computeChain, type Chain, type ComputedChain, type FindTopology } from "#lib/circuit/voice/index.ts";

/** Computes one state of a voice after the other, each from the one before. */
export function computing(): (chain: Chain, find: FindTopology) => ComputedChain {
  let before: ComputedChain | undefined;
  return (chain, find) => {
    before = computeChain(chain, find, before);
    return before;
  };
}
