import type { FindTopology } from "./chain.ts";
import type { ComputedChain } from "./compute.ts";
import { levelRanges, levelsAtKnobEnds, type LevelRange } from "./knobs.ts";
import { firstToClip, levelsOf, meetingsOf, type Level, type Meeting } from "./levels.ts";

export interface LevelPlan {
  levels: (Level & { range: LevelRange; originName?: string })[];
  firstToClip: Level | undefined;
  meetings: (Meeting & { stageName: string; paths: string })[];
}

/** The levels of a voice as it stands and at both ends of every knob, with names in place of ids. */
export function levelPlanOf(computed: ComputedChain, find: FindTopology): LevelPlan {
  const levels = levelsOf(computed);
  const ranges = levelRanges(levels, levelsAtKnobEnds(computed, find));
  const nameOf = (stage: string) => computed.stages.get(stage)?.stage.name;
  return {
    levels: levels.map((level) => {
      const originName = level.origin === undefined ? undefined : nameOf(level.origin);
      return { ...level, range: ranges.get(level.node)!, ...(originName !== undefined && { originName }) };
    }),
    firstToClip: firstToClip(levels),
    meetings: meetingsOf(computed).map((meeting) => {
      const { ports } = computed.stages.get(meeting.stage)!.found.kind;
      const label = (port: string) => ports.find((one) => one.id === port)!.label;
      return { ...meeting, stageName: nameOf(meeting.stage)!, paths: meeting.ports.map(label).join(" and ") };
    }),
  };
}
