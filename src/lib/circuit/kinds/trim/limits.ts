import type { Conditions, Parts, ResultValues, ConditionValues } from "../../stage/values.ts";
import type { Limit } from "../../stage/topology.ts";
import type { conditions, trimResults } from "./fields.ts";
import { perCent } from "../../stage/shown.ts";

const leastShare = 0.4;
const leastDegrees = 100;
const mostSensitivity = 0.02;
const [centreFrom, centreTo] = [0.25, 0.75];

type TrimLimit = Limit<Parts, typeof conditions & Conditions, ReturnType<typeof trimResults<"">>>;
type Context = Parameters<TrimLimit["check"]>[0];

const hasWindow = ({ windows }: Context) => "least" in windows && "most" in windows;
const figures = ({ results }: Context) => results as ResultValues<ReturnType<typeof trimResults<"">>>;
const angle = ({ conditions: given }: Context) => (given as ConditionValues<typeof conditions>).electricalAngle;

/** What the trade warns of in any knob (trade brief 2.15). */
export const limits: readonly TrimLimit[] = [
  {
    code: "little-travel",
    severity: "caution",
    unit: "°",
    source: "practice",
    template:
      "Only {value} of the travel lie inside the window; {limit} and more can be set by hand. Take a smaller pot and more padding.",
    check: (context) => {
      const limit = Math.max(leastDegrees, leastShare * angle(context));
      const value = figures(context).usefulDegrees!;
      return hasWindow(context) && value < limit * (1 - 1e-9) ? { value, limit } : undefined;
    },
  },
  {
    code: "too-sensitive",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "A degree moves the value by {value} of itself at the centre of the window; above {limit} it cannot be set by hand.",
    check: (context) => {
      const value = figures(context).sensitivityPerDegree;
      return value !== undefined && value > mostSensitivity ? { value, limit: mostSensitivity } : undefined;
    },
  },
  {
    code: "window-not-covered",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "trim-derivation",
    template:
      "The worst unit misses an end of the window: its margin is {value}, and {limit} is the least. Take a larger pot, or less padding.",
    check: (context) => {
      const value = figures(context).worstCaseMargin;
      return value !== undefined && value < 0 ? { value, limit: 0 } : undefined;
    },
  },
  {
    code: "centre-off",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "The centre of the window lies at {value} of the travel, beyond {limit}: most of the knob is on one side of what is wanted.",
    check: (context) => {
      const value = figures(context).centre!;
      if (!hasWindow(context) || (value >= centreFrom && value <= centreTo)) return undefined;
      return { value, limit: value < centreFrom ? centreFrom : centreTo };
    },
  },
];
