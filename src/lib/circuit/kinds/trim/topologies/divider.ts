import { formatQuantity } from "../../../quantity/format.ts";
import { potFraction } from "../../../parts/potLaw.ts";
import { common } from "../../../stage/commonConditions.ts";
import { condition, pot, resistor, target } from "../../../stage/fields.ts";
import { defineTopology, type DesignRefusal, type Limit } from "../../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues } from "../../../stage/values.ts";
import { travelCurve } from "../curves.ts";
import { conditions as knobConditions, trimResults } from "../fields.ts";
import { trimFigures, windowOf } from "../figures.ts";
import { dividerFormulas } from "../formulas.ts";
import { dividerJoints } from "../joints.ts";
import { limits as knobLimits } from "../limits.ts";
import { dividerSetting, wiperResistance, type Window } from "../model.ts";
import { dividerNetwork } from "../networks.ts";
import { sources } from "../sources.ts";
import { perCent } from "../../../stage/shown.ts";

const parts = {
  rTop: resistor({
    label: "above",
    symbol: "R_t",
    default: 390e3,
    least: 0,
    help: "From the reference to the pot; 0 where none is fitted.",
  }),
  rPot: pot({
    label: "pot",
    symbol: "R_pot",
    default: 10e3,
    least: 100,
    help: "Between the two.",
    padding: ["rTop", "rBottom"],
  }),
  rBottom: resistor({
    label: "below",
    symbol: "R_b",
    default: 12e3,
    least: 0,
    help: "From the pot to ground; 0 where none is fitted.",
  }),
} as const;

const side = { unit: "V", least: 10e-3, most: 10, window: 0.1 } as const;
const targets = {
  least: target({ ...side, label: "Least voltage", symbol: "V_least", default: 0.35, result: "endLow" }),
  most: target({ ...side, label: "Most voltage", symbol: "V_most", default: 0.65, result: "endHigh" }),
} as const;

const conditions = {
  ...knobConditions,
  referenceVoltage: condition({
    label: "Reference",
    symbol: "V_ref",
    unit: "V",
    default: 12,
    least: 1,
    most: 15,
    accepts: [1e-3, 100],
    scale: "linear",
    help: "What stands across the whole chain.",
  }),
  loadResistance: common.loadResistance,
  mostVoltage: condition({
    label: "Most voltage that is safe",
    symbol: "V_max",
    unit: "V",
    default: null,
    least: 10e-3,
    most: 12,
    suggestion: 1,
  }),
} as const;

const results = {
  ...trimResults("V"),
  wiperResistance: { label: "Resistance at the wiper, as set", symbol: "R_w", unit: "Ω", formula: "wiper" },
  wiperResistanceMost: { label: "Resistance at the wiper, most", symbol: "R_w,max", unit: "Ω", formula: "wiper" },
} as const;

type P = typeof parts;
type C = typeof conditions;
type R = typeof results;
interface State {
  parts: PartValues<P>;
  conditions: ConditionValues<C>;
}

const settingOf = ({ parts: values, conditions: given }: State) =>
  dividerSetting(values, given.endResistance, given.referenceVoltage, given.loadResistance);

function analyse(state: State, window: Window | undefined): ResultValues<R> {
  const { potLaw, rotation, midFraction, lawShape } = state.conditions;
  const wiper = wiperResistance(state.parts, potFraction(potLaw, rotation, midFraction, lawShape));
  return {
    ...trimFigures(settingOf(state), state.conditions, window, (a, b) => (a + b) / 2),
    wiperResistance: wiper.asSet,
    wiperResistanceMost: wiper.largest,
  };
}

/** Exact padding without a load; `designExactly` corrects for one. */
function design({ least, most }: Window, given: ConditionValues<C>, rPot: number): PartValues<P> | DesignRefusal {
  const { referenceVoltage, endResistance } = given;
  if (!(most > least && most < referenceVoltage))
    return {
      refused: true,
      field: "most",
      message: `The most must lie above the least and below the reference of ${formatQuantity(referenceVoltage, "V")}.`,
    };
  const sum = (referenceVoltage * (1 - 2 * endResistance) * rPot) / (most - least);
  const rBottom = (least * sum) / referenceVoltage - endResistance * rPot;
  const rTop = sum - rPot - rBottom;
  if (rBottom >= 0 && rTop >= 0) return { rTop, rPot, rBottom };
  return {
    refused: true,
    field: rBottom < 0 ? "least" : "most",
    message: "What the pot leaves at its ends already passes the window. Widen the window, or take a better pot.",
  };
}

const mostLoadingError = 0.01;

const limits: readonly Limit<P, C, R>[] = [
  ...(knobLimits as unknown as readonly Limit<P, C, R>[]),
  {
    code: "end-unsafe",
    severity: "fault",
    unit: "V",
    source: "trim-derivation",
    template:
      "At the high end a unit may give {value}, above the {limit} that is safe. Raise the resistor above the pot.",
    check: ({ conditions: { mostVoltage: limit }, results: { extremeHigh: value } }) =>
      limit !== null && value! > limit ? { value: value!, limit } : undefined,
  },
  {
    code: "wiper-loaded",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "trim-derivation",
    template:
      "The wiper's own resistance is up to {value} of the load, above {limit}: the load bends the law. The figures include it; buffer it, or take a smaller pot.",
    check: ({ conditions: { loadResistance }, results: { wiperResistanceMost } }) => {
      if (loadResistance === null) return undefined;
      const value = wiperResistanceMost! / loadResistance;
      return value > mostLoadingError ? { value, limit: mostLoadingError } : undefined;
    },
  },
];

export const divider = defineTopology({
  id: "divider",
  name: "Divider",
  summary: "A pot between two padding resistors: sets a voltage inside a window, or a level.",
  parts,
  conditions,
  targets,
  results,
  analyse: (state, wanted) => analyse(state, windowOf(wanted)),
  design: ({ targets: window, conditions: given, given: decided }) =>
    design(window, given, decided.rPot ?? parts.rPot.default),
  anchors: [{ part: "rPot", least: 1e3, most: 100e3 }],
  curves: [travelCurve<State>(settingOf, { quantity: "Voltage at the wiper", unit: "V" })],
  limits,
  formulas: dividerFormulas,
  sources,
  network: dividerNetwork,
  joints: dividerJoints,
  devices: [],
  traits: [
    { label: "Sets", text: "a voltage or a level" },
    { label: "Span depends on", text: "the pot's tolerance, unless the padding is small" },
    { label: "Law for equal ratios per degree", text: "logarithmic" },
    { label: "At the low end", text: "the resistor below the pot" },
  ],
  leavesOut: [
    "the wiper's contact resistance and its noise",
    "the tolerance of the law itself, which is wide",
    "temperature coefficients of track and padding",
  ],
});
