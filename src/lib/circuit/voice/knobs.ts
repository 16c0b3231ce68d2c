import type { Chain, FindTopology } from "./chain.ts";
import { computeChain, type ComputedChain } from "./compute.ts";
import { levelsOf, type Level } from "./levels.ts";

/** A pot that somebody turns. */
export interface Knob {
  stage: string;
  stageName: string;
  /** The condition that says where it stands. */
  condition: string;
  label: string;
  /** Where it stands: 0 to 1 of its travel. */
  at: number;
  /** The pot's designator, where it has one. */
  designator?: string;
}

const rotation = "rotation";

/** Every pot of a voice that is fitted and whose position a figure depends on. */
export function knobsOf({ stages }: ComputedChain): Knob[] {
  return [...stages.values()].flatMap(({ stage, found: { topology }, conditions }): Knob[] => {
    const field = topology.conditions[rotation];
    const pot = Object.entries(topology.parts).find(([key, part]) => part.partClass === "pot" && stage.parts[key]! > 0);
    const at = conditions[rotation];
    if (!field || !pot || typeof at !== "number") return [];
    const designator = stage.designators[pot[0]];
    return [
      {
        ...{ stage: stage.id, stageName: stage.name, condition: rotation, label: field.label, at },
        ...(designator !== undefined && { designator }),
      },
    ];
  });
}

/** The voice with one knob turned. */
export function withKnob(chain: Chain, { stage: id, condition }: Pick<Knob, "stage" | "condition">, at: number): Chain {
  const turned = (stage: Chain["stages"][number]) =>
    stage.id === id ? { ...stage, conditions: { ...stage.conditions, [condition]: at } } : stage;
  return { ...chain, stages: chain.stages.map(turned) };
}

export interface KnobEnds {
  knob: Knob;
  /** Levels with the knob at its low end, and at its high end. */
  low: Level[];
  high: Level[];
}

/** The levels at both ends of every knob that moves any, the other knobs staying where they are. */
export function levelsAtKnobEnds(computed: ComputedChain, find: FindTopology): KnobEnds[] {
  const now = new Map(levelsOf(computed).map(({ node, rms }) => [node, rms]));
  return knobsOf(computed).flatMap((knob): KnobEnds[] => {
    const [low, high] = [0, 1].map((at) => levelsOf(computeChain(withKnob(computed.chain, knob, at), find, computed)));
    const moves = [low!, high!].some((levels) =>
      levels.some(({ node, rms }) => Math.abs(rms - (now.get(node) ?? 0)) > 1e-9 * (rms + (now.get(node) ?? 0))),
    );
    return moves ? [{ knob, low: low!, high: high! }] : [];
  });
}

/** At one point of the voice: the loudest and the quietest that any one knob makes it, and the least headroom. */
export interface LevelRange {
  least: number;
  most: number;
  leastHeadroomDb?: number;
  /** The knob and its end where the headroom is least. */
  worst?: { knob: Knob; end: "low" | "high" };
}

export function levelRanges(now: readonly Level[], ends: readonly KnobEnds[]): Map<string, LevelRange> {
  const ranges = new Map<string, LevelRange>();
  const take = (level: Level, worst?: LevelRange["worst"]) => {
    const range = ranges.get(level.node) ?? { least: Infinity, most: 0 };
    const headroom = level.headroomDb;
    const worse = headroom !== undefined && headroom < (range.leastHeadroomDb ?? Infinity);
    ranges.set(level.node, {
      ...range,
      ...{ least: Math.min(range.least, level.rms), most: Math.max(range.most, level.rms) },
      ...(worse && { leastHeadroomDb: headroom, ...(worst && { worst }) }),
    });
  };
  for (const level of now) take(level);
  for (const { knob, low, high } of ends) {
    for (const level of low) take(level, { knob, end: "low" });
    for (const level of high) take(level, { knob, end: "high" });
  }
  return ranges;
}
