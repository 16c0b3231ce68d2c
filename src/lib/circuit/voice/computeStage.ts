import { analyseStage } from "../stage/analyse.ts";
import { completeConditions, isAccepted, type PlainConditions } from "../stage/defaults.ts";
import { acceptedRange, type ConditionField } from "../stage/fields.ts";
import type { AnalysedState, Decided, JointState } from "../stage/joint.ts";
import { ownOrigin, type Demand, type Signal } from "../stage/signal.ts";
import { alike } from "./alike.ts";
import type { ChainStage, FoundTopology } from "./chain.ts";
import type { ComputedStage } from "./compute.ts";
import { sharedConditions } from "./conditions.ts";

export interface Neighbours {
  /** What comes in at a port. */
  input(port: string): Signal | undefined;
  /** What is asked of a port; undefined where nothing is linked to it. */
  demand(port: string): Demand | undefined;
}

/** The stage's conditions without its neighbours: its own, and those that hold for the whole voice. */
export function ownConditions(stage: ChainStage, { topology }: FoundTopology, voice: PlainConditions): PlainConditions {
  const conditions = completeConditions(topology, stage.conditions);
  if (stage.apart) return conditions;
  for (const key of sharedConditions) {
    const field = topology.conditions[key];
    const value = voice[key];
    if (field && value !== undefined && isAccepted(field, value)) conditions[key] = value;
  }
  return conditions;
}

/** What the stage's inputs ask of those that feed them. */
export function asksOf(
  { topology }: FoundTopology,
  state: JointState & { results?: AnalysedState["results"] },
): Record<string, Demand> {
  return Object.fromEntries(
    Object.entries(topology.joints ?? {}).flatMap(([port, joint]) =>
      joint.asks && joint.fitted?.(state) !== false ? [[port, joint.asks(state)]] : [],
    ),
  );
}

/** The stage under what its neighbours decide. An analysis that would come out the same is taken over. */
export function computeStage(
  stage: ChainStage,
  found: FoundTopology,
  voice: PlainConditions,
  known: ComputedStage | undefined,
  neighbours: Neighbours,
): ComputedStage {
  const { topology } = found;
  const own = ownConditions(stage, found, voice);
  const inputs: Record<string, Signal | undefined> = {};
  for (const port of found.kind.ports) if (port.direction === "in") inputs[port.id] = neighbours.input(port.id);
  const { conditions, decided } = stage.apart
    ? { conditions: own, decided: {} }
    : decide(stage, found, own, inputs, neighbours);
  const same = known?.stage === stage && alike(known.conditions, conditions);
  const analysis = same ? known.analysis : analyseStage(topology, { ...stage, conditions });
  const state: AnalysedState = { parts: stage.parts, conditions, results: analysis.results, inputs };
  const gives: Record<string, Signal | undefined> = {};
  for (const [port, joint] of Object.entries(topology.joints ?? {})) {
    if (joint.gives) gives[port] = sound(joint.gives(state), stage.id);
  }
  return { stage, found, conditions, decided, analysis, inputs, gives, asks: asksOf(found, state) };
}

function decide(
  stage: ChainStage,
  { topology }: FoundTopology,
  own: PlainConditions,
  inputs: Record<string, Signal | undefined>,
  neighbours: Neighbours,
) {
  const conditions = { ...own };
  const decided: Record<string, { value: number | string | null; port: string }> = {};
  const state = { parts: stage.parts, conditions: own };
  const take = (port: string, values: Decided) => {
    for (const [key, given] of Object.entries(values)) {
      const field = topology.conditions[key];
      if (!field || given === undefined) continue;
      const value = withinReach(field, given);
      if (!isAccepted(field, value)) continue;
      conditions[key] = value;
      decided[key] = { value, port };
    }
  };
  for (const [port, joint] of Object.entries(topology.joints ?? {})) {
    const signal = inputs[port];
    if (signal && joint.takes && joint.fitted?.(state) !== false) take(port, joint.takes(signal, state));
    const demand = joint.bears && neighbours.demand(port);
    if (demand) take(port, joint.bears!(demand, state));
  }
  if (topology.meets) take("", topology.meets(inputs, { parts: stage.parts, conditions }));
  return { conditions, decided };
}

/** A figure beyond what is computed stands at the bound, a thousand times past any sane value: a load of nearly nothing. */
function withinReach(field: ConditionField, value: number | string | null): number | string | null {
  if (field.type !== "number" || typeof value !== "number") return value;
  const [least, most] = acceptedRange(field);
  return Math.min(Math.max(value, least), most);
}

/** A signal with the stage's name on the wave it makes; one with a figure that is none passes nothing on. */
function sound(signal: Signal | undefined, id: string): Signal | undefined {
  if (!signal || Object.values(signal).some((value) => typeof value === "number" && !Number.isFinite(value))) {
    return undefined;
  }
  if (signal.sort !== "audio" || !(ownOrigin in signal.mix)) return signal;
  const { [ownOrigin]: own, ...others } = signal.mix;
  return { ...signal, mix: { ...others, [id]: own! } };
}
