import type { Limit } from "../../../../stage/topology.ts";
import { capacitorLimits } from "../../limits.ts";
import type { C, P, R } from "./analyse.ts";

const source = "passive-derivation";

/** What the trade warns of in this network (trade brief 2.11). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "quality-impossible",
    severity: "caution",
    unit: "",
    source,
    template:
      "A quality factor of {value} is asked for, and no network of resistors and capacitors alone reaches {limit}. Take the multiple-feedback network.",
    check: ({ conditions: { qualityWanted } }) =>
      qualityWanted !== null && qualityWanted >= 0.5 ? { value: qualityWanted, limit: 0.5 } : undefined,
  },
  {
    code: "load-too-low",
    severity: "caution",
    unit: "Ω",
    source,
    template:
      "The load is {value}, below {limit} (ten times R_2): it moves the centre and lowers the gain. The figures here include it; another load changes them.",
    check: ({ parts, conditions: { loadResistance } }) =>
      loadResistance !== null && loadResistance < 10 * parts.r2
        ? { value: loadResistance, limit: 10 * parts.r2 }
        : undefined,
  },
  {
    code: "source-loads-input",
    severity: "caution",
    unit: "Ω",
    source,
    template:
      "The source resistance is {value}, above {limit} (a tenth of R_1): it moves the centre and lowers the gain. The figures here include it; a pot in front changes it as it turns.",
    check: ({ parts, conditions: { sourceResistance } }) =>
      sourceResistance > parts.r1 / 10 ? { value: sourceResistance, limit: parts.r1 / 10 } : undefined,
  },
  ...capacitorLimits,
];
