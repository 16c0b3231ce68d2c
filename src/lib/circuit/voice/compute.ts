import type { Analysis } from "../stage/analyse.ts";
import type { PlainConditions } from "../stage/defaults.ts";
import { joinedDemand, type Demand, type Signal } from "../stage/signal.ts";
import { alike } from "./alike.ts";
import type { Chain, ChainStage, FindTopology, FoundTopology, LinkEnd } from "./chain.ts";
import { asksOf, computeStage, ownConditions } from "./computeStage.ts";
import { signalOrder } from "./graph.ts";
import { behindLoad, loadOf } from "./sharedOutput.ts";
import { wiringOf, type Wiring } from "./wiring.ts";

/** One stage with all that its neighbours decide. */
export interface ComputedStage {
  stage: ChainStage;
  found: FoundTopology;
  /** Complete, the neighbours' and the voice's included. */
  conditions: PlainConditions;
  /** Which of those a link decided, and through which port; "" where several inputs did together. */
  decided: Readonly<Record<string, { value: number | string | null; port: string }>>;
  analysis: Analysis;
  inputs: Readonly<Record<string, Signal | undefined>>;
  gives: Readonly<Record<string, Signal | undefined>>;
  asks: Readonly<Record<string, Demand>>;
}

export interface ComputedChain {
  chain: Chain;
  /** By id of the stage; a stage whose network this version does not know is absent. */
  stages: ReadonlyMap<string, ComputedStage>;
  /** Every stage after those that feed it. */
  order: readonly string[];
  wiring: Wiring;
  /** How many analyses it took to get here from the computation before. */
  analysed: number;
  /** Stages whose load and signal chase each other without coming to rest. */
  unsettled: readonly string[];
}

/** A load that depends on the signal and a signal that depends on the load settle in a few rounds, or not at all. */
const mostVisits = 60;

/**
 * Computes a voice: each stage under what its neighbours give it and ask of it. With the computation before, only what
 * changed and what depends on it is computed again.
 *
 * @param chain free of the faults that `linkFaults` finds
 */
export function computeChain(chain: Chain, find: FindTopology, before?: ComputedChain): ComputedChain {
  const order = signalOrder(chain.stages, chain.links);
  const wiring = wiringOf(chain);
  const work = begin(chain, find, wiring, before);
  const { stages, asks, found, dirty } = work;
  const rank = new Map(order.map((id, index) => [id, index]));
  const visits = new Map<string, number>();
  const unsettled = new Set<string>();
  let analysed = 0;
  while (dirty.size > 0) {
    const id = firstOf(dirty, rank);
    dirty.delete(id);
    visits.set(id, (visits.get(id) ?? 0) + 1);
    if (visits.get(id)! > mostVisits) {
      unsettled.add(id);
      continue;
    }
    const known = stages.get(id) ?? before?.stages.get(id);
    const next = computeStage(work.byId.get(id)!, found.get(id)!, chain.conditions, known, {
      input(port) {
        const source = wiring.sourceOf(id, port);
        if (!source) return undefined;
        const others = wiring.fedBy(source.stage, source.port).filter((end) => end.stage !== id || end.port !== port);
        const load = loadOf(others.map((end) => asks.get(end.stage)?.[end.port] ?? {}));
        return behindLoad(stages.get(source.stage)?.gives[source.port], load);
      },
      demand(port) {
        const ends = wiring.fedBy(id, port);
        return ends.length === 0 ? undefined : joinedDemand(ends.map((end) => asks.get(end.stage)?.[end.port] ?? {}));
      },
    });
    if (next.analysis !== known?.analysis) analysed += 1;
    for (const [port, signal] of Object.entries(next.gives)) {
      if (stages.has(id) && alike(stages.get(id)!.gives[port], signal)) continue;
      if (!stages.has(id) && known && alike(known.gives[port], signal)) continue;
      for (const end of wiring.fedBy(id, port)) if (found.has(end.stage)) dirty.add(end.stage);
    }
    for (const [port, demand] of Object.entries(next.asks)) {
      const source = wiring.sourceOf(id, port);
      if (source && !alike(asks.get(id)?.[port], demand)) tell(source, id, wiring, found, dirty);
    }
    stages.set(id, next);
    asks.set(id, next.asks);
  }
  return { chain, stages, order, wiring, analysed, unsettled: [...unsettled] };
}

/** Takes over what stands from the computation before, and marks what must be computed. */
function begin(chain: Chain, find: FindTopology, wiring: Wiring, before: ComputedChain | undefined) {
  const sameVoice = before !== undefined && alike(before.chain.conditions, chain.conditions);
  const stages = new Map<string, ComputedStage>();
  const asks = new Map<string, Readonly<Record<string, Demand>>>();
  const found = new Map<string, FoundTopology>();
  const dirty = new Set<string>();
  const byId = new Map(chain.stages.map((stage) => [stage.id, stage]));
  for (const stage of chain.stages) {
    const topology = find(stage.kind, stage.topology);
    if (topology) found.set(stage.id, topology);
  }
  for (const stage of chain.stages) {
    const own = found.get(stage.id);
    if (!own) continue;
    const known = before?.stages.get(stage.id);
    if (known && sameVoice && known.stage === stage && alike(before!.wiring.of(stage.id), wiring.of(stage.id))) {
      stages.set(stage.id, known);
      asks.set(stage.id, known.asks);
      continue;
    }
    dirty.add(stage.id);
    const conditions = ownConditions(stage, own, chain.conditions);
    const asked = asksOf(own, {
      parts: stage.parts,
      conditions,
      ...(known?.stage.topology === stage.topology && { results: known.analysis.results }),
    });
    asks.set(stage.id, asked);
    // What feeds it is told at once, so that it need not be computed twice.
    for (const [port, demand] of Object.entries(asked)) {
      const source = wiring.sourceOf(stage.id, port);
      if (source && !alike(known?.asks[port], demand)) tell(source, stage.id, wiring, found, dirty);
    }
  }
  for (const id of dirty) stages.delete(id);
  return { stages, asks, found, dirty, byId };
}

/** A load that changed concerns the output it is on, and whatever else is on that output. */
function tell(
  source: LinkEnd,
  by: string,
  wiring: Wiring,
  found: ReadonlyMap<string, FoundTopology>,
  dirty: Set<string>,
): void {
  const concerned = [source, ...wiring.fedBy(source.stage, source.port).filter(({ stage }) => stage !== by)];
  for (const { stage } of concerned) if (found.has(stage)) dirty.add(stage);
}

function firstOf(dirty: ReadonlySet<string>, rank: ReadonlyMap<string, number>): string {
  let first: string | undefined;
  for (const id of dirty) if (first === undefined || rank.get(id)! < rank.get(first)!) first = id;
  return first!;
}
