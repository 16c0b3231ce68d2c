import type { Limit } from "../../stage/topology.ts";
import { paths } from "./fields.ts";
import { fittedPaths, type C, type P, type R } from "./analyse.ts";
import { perCent } from "../../stage/shown.ts";

/** What the trade warns of in a sum (trade brief 2.16). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "paths-subtract",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "sum-derivation",
    template:
      "The paths have unequal numbers of inversions and a correlation of {value}, above {limit}: their levels subtract. Take one path from the other input, or add an inversion.",
    check: ({ parts, conditions }) => {
      const playing = fittedPaths({ parts, conditions }).filter(({ level }) => level !== null);
      const unequal = new Set(playing.map(({ sign }) => sign)).size > 1;
      return unequal && conditions.correlation > 0.3 ? { value: conditions.correlation, limit: 0.3 } : undefined;
    },
  },
  {
    code: "source-loads-path",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "The source resistance of path {detail} is {value} of its resistor, above {limit}: its gain changes with the state of what drives it. Take a larger resistor, or buffer the path.",
    check: ({ parts, conditions }) => {
      // A resistor of next to nothing has a share beyond telling.
      const shares = paths.map((path) => {
        const resistance = parts[`r${path}`];
        return resistance > 0 ? Math.min(conditions[`source${path}`]! / resistance, 1e6) : 0;
      });
      const most = Math.max(...shares);
      return most > 0.05 ? { value: most, limit: 0.05, detail: String(shares.indexOf(most) + 1) } : undefined;
    },
  },
  {
    code: "slow-op-amp",
    severity: "caution",
    unit: "",
    source: "sum-derivation",
    template:
      "Noise gain times signal frequency over gain-bandwidth is {value}, above {limit}: the op amp's own speed shows. Take a faster one, or sum fewer paths.",
    check: ({ conditions, results }) => {
      if (conditions.gainBandwidth === null) return undefined;
      const share = results.noiseGain! * (conditions.signalFrequency / conditions.gainBandwidth);
      return share > 0.01 ? { value: share, limit: 0.01 } : undefined;
    },
  },
];
