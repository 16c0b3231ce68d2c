import { formatQuantity } from "../../quantity/format.ts";
import type { FindTopology } from "../chain.ts";
import type { ComputedChain } from "../compute.ts";
import { levelRanges, levelsAtKnobEnds } from "../knobs.ts";
import { levelsOf, meetingsOf, type Level } from "../levels.ts";
import type { CheckItem } from "./item.ts";

/** dB that every point should keep between its peaks and its clip level. */
export const leastHeadroom = 3;
/** V RMS at the jack at the peak of a hit: 10 V peak to peak of noise at four standard deviations. */
export const rackLevel = 1.25;
/** dB either way that the jack may be off. */
const jackSlack = 3;
/** dB under the rack level that the floor between hits should lie. */
export const mostFloor = -70;
/** Correlation from which the parity of two paths is heard. */
const heardCorrelation = 0.3;

const decibels = (ratio: number) => 20 * Math.log10(ratio);

/** Points that clip, overdrive, subtract, or miss the level of the rack. */
export function levelItems(computed: ComputedChain, find: FindTopology): CheckItem[] {
  const levels = levelsOf(computed);
  const ranges = levelRanges(levels, levelsAtKnobEnds(computed, find));
  return [
    ...levels.flatMap((level) => [...headroomItem(level, ranges), ...insideItem(level), ...jackItems(level)]),
    ...meetingItems(computed),
  ];
}

function headroomItem(level: Level, ranges: ReturnType<typeof levelRanges>): CheckItem[] {
  const range = ranges.get(level.node);
  const { headroomDb } = level;
  if (headroomDb !== undefined && headroomDb < leastHeadroom) {
    return [headroom(level, headroomDb, headroomDb < 0 ? "It clips." : "")];
  }
  const worst = range?.worst;
  if (range?.leastHeadroomDb === undefined || !worst || range.leastHeadroomDb >= leastHeadroom) return [];
  const knob = `${worst.knob.label} of ${worst.knob.stageName}`;
  return [headroom(level, range.leastHeadroomDb, `That is with the ${knob} at its ${worst.end} end.`)];
}

const headroom = (level: Level, value: number, more: string): CheckItem => ({
  ...{ severity: "caution", stage: level.stage, code: "headroom", value, limit: leastHeadroom, unit: "dB" },
  message:
    `Headroom is ${formatQuantity(value, "dB")}, under ${formatQuantity(leastHeadroom, "dB")}: peaks of ${formatQuantity(level.peak, "V")} against ${formatQuantity(level.clip ?? 0, "V")}. ${more}`.trim(),
});

function insideItem({ stage, label, rms, most }: Level): CheckItem[] {
  if (most === undefined || rms <= most) return [];
  const message = `${label}: ${formatQuantity(rms, "V")} RMS, over the ${formatQuantity(most, "V")} that stays clean. Attenuate more, or let it be dirty on purpose.`;
  return [{ severity: "caution", stage, code: "overdriven", message, value: rms, limit: most, unit: "V" }];
}

function jackItems({ jack, stage, rms, floor }: Level): CheckItem[] {
  if (!jack || rms === 0) return [];
  const items: CheckItem[] = [];
  const off = decibels(rms / rackLevel);
  if (Math.abs(off) > jackSlack) {
    const message = `The jack gives ${formatQuantity(rms, "V")} RMS, ${formatQuantity(Math.abs(off), "dB")} ${off > 0 ? "over" : "under"} the rack's ${formatQuantity(rackLevel, "V")}.`;
    items.push({ severity: "note", stage, code: "jack-level", message, value: rms, limit: rackLevel, unit: "V" });
  }
  const under = floor > 0 ? decibels(floor / rms) : -Infinity;
  if (under > mostFloor) {
    const message = `Between hits the jack still gives ${formatQuantity(floor, "V")} RMS, ${formatQuantity(under, "dB")} of a hit; ${formatQuantity(mostFloor, "dB")} would be silent.`;
    items.push({ severity: "caution", stage, code: "jack-floor", message, value: under, limit: mostFloor, unit: "dB" });
  }
  return items;
}

function meetingItems(computed: ComputedChain): CheckItem[] {
  return meetingsOf(computed).flatMap(({ stage, ports, correlation, parityDb, commonAncestor }): CheckItem[] => {
    const { kind } = computed.stages.get(stage)!.found;
    const paths = ports.map((port) => kind.ports.find(({ id }) => id === port)!.label).join(" and ");
    if (correlation < -heardCorrelation) {
      const message = `${paths} carry the same wave with unequal inversions (correlation ${formatQuantity(correlation, "")}): they subtract, and with the other parity the two would be ${formatQuantity(-parityDb, "dB")} louder as they arrive. Invert one of them.`;
      return [
        {
          severity: "caution",
          stage,
          code: "paths-subtract",
          message,
          value: correlation,
          limit: -heardCorrelation,
          unit: "",
        },
      ];
    }
    if (!commonAncestor) return [];
    const message = `${paths} go back to one source through filters of their own; they are added as if independent. Where the bands overlap, the sum may differ by up to 3 dB.`;
    return [{ severity: "note", stage, code: "common-ancestor", message }];
  });
}
