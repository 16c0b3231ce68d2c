import { completeConditions, type PlainConditions, type PlainValues } from "../stage/defaults.ts";
import { midSentence } from "../stage/midSentence.ts";
import type { AnyTopology, DesignRefusal } from "../stage/topology.ts";

const maxSteps = 80;
const settled = 1e-12;

/**
 * Exact parts that give the targets under the given conditions, finite gain-bandwidth and source included.
 *
 * The topology's own `design` may invert an idealised model: its targets are corrected by the ratio of wanted to got
 * until the exact analysis agrees, and the answer is only given when it does.
 *
 * @param given parts already decided, the topology's anchors among them
 */
export function designExactly(
  topology: AnyTopology,
  targets: PlainValues,
  conditions: PlainConditions,
  given: PlainValues,
): PlainValues | DesignRefusal {
  const complete = completeConditions(topology, conditions) as never;
  const aim = { ...targets };
  let last = Infinity;
  for (let step = 0; step < maxSteps; step++) {
    const parts = topology.design({ targets: aim, conditions: complete, given });
    if (isRefusal(parts)) return parts;
    const results = topology.analyse({ parts, conditions: complete });
    let worst = 0;
    for (const [key, wanted] of Object.entries(targets)) {
      const got = results[topology.targets[key]!.result];
      if (typeof got !== "number" || !(got > 0)) return unreachable(topology, key);
      worst = Math.max(worst, Math.abs(Math.log(wanted / got)));
      aim[key] = aim[key]! * (wanted / got);
    }
    // Rounding in the analysis may keep the last digit moving; no progress at that level is as settled as it gets.
    if (worst < settled || (worst < 1e-9 && worst >= last)) return parts;
    last = worst;
  }
  return unreachable(topology, Object.keys(targets)[0]!);
}

export function isRefusal(outcome: PlainValues | DesignRefusal): outcome is DesignRefusal {
  return "refused" in outcome && outcome["refused"] === true;
}

function unreachable(topology: AnyTopology, field: string): DesignRefusal {
  const label = midSentence(topology.targets[field]!.label);
  return {
    refused: true,
    field,
    message: `Under these conditions no parts reach the ${label} asked for. Move it towards its usual value, or ease the conditions that are switched on.`,
  };
}
