import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal } from "../../stage/topology.ts";
import type { ConditionValues } from "../../stage/values.ts";
import type { C } from "./figures.ts";

const usualOutput = 1e3;
/** Levels nearer than this are the same level; the analysis then corrects the gain to it. */
const same = 1e-2;

/**
 * The output resistor for a level at the jack: what the gain makes of the input, less what R_o loses into the load.
 *
 * @returns a refusal where the level cannot follow from this input and gain
 */
export function outputResistorFor(
  { gain, level }: { gain: number; level: number },
  conditions: ConditionValues<C>,
  given: number | undefined,
): number | DesignRefusal {
  const { sourceRms, loadResistance, loads } = conditions;
  const unloaded = sourceRms * gain;
  if (loadResistance === null) {
    if (Math.abs(unloaded / level - 1) < same) return given ?? usualOutput;
  } else {
    const ro = (loadResistance / loads) * (unloaded / level - 1);
    if (ro > 0) return ro;
  }
  return {
    refused: true,
    field: "level",
    message: `A gain of ${formatQuantity(gain, "", 3)} makes ${formatQuantity(unloaded, "V", 3)} of the ${formatQuantity(sourceRms, "V", 3)} at the input, and ${formatQuantity(level, "V", 3)} is asked for. Ask for a gain of ${formatQuantity(level / sourceRms, "", 3)}, or for that level.`,
  };
}
