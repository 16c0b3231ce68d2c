import { formatQuantity } from "../../../quantity/format.ts";
import { condition, pot, resistor, target } from "../../../stage/fields.ts";
import { defineTopology, type DesignRefusal, type Limit } from "../../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues } from "../../../stage/values.ts";
import { travelCurve } from "../curves.ts";
import { conditions as knobConditions, trimResults } from "../fields.ts";
import { trimFigures, windowOf } from "../figures.ts";
import { rheostatFormulas } from "../formulas.ts";
import { limits as knobLimits } from "../limits.ts";
import { rheostatSetting, type Window } from "../model.ts";
import { rheostatNetwork } from "../networks.ts";
import { sources } from "../sources.ts";

const parts = {
  rFixed: resistor({ label: "padding", symbol: "R_fix", default: 8.2e3, help: "In series; sets the low end." }),
  rPot: pot({
    label: "pot",
    symbol: "R_pot",
    default: 25e3,
    least: 100,
    help: "Sets the span.",
    padding: ["rFixed"],
  }),
} as const;

const side = { unit: "Ω", least: 100, most: 1e6, window: 0.1 } as const;
const targets = {
  least: target({ ...side, label: "Least resistance", symbol: "R_least", default: 11e3, result: "endLow" }),
  most: target({ ...side, label: "Most resistance", symbol: "R_most", default: 26e3, result: "endHigh" }),
} as const;

const conditions = {
  ...knobConditions,
  controlVoltage: condition({
    label: "Voltage across it",
    symbol: "V",
    unit: "V",
    default: null,
    least: 0.1,
    most: 12,
    suggestion: 7.8,
    help: "Where the rheostat sets a current; left out, only resistances count.",
  }),
  mostCurrent: condition({
    label: "Most current that is safe",
    symbol: "I_max",
    unit: "A",
    default: 1e-3,
    least: 100e-6,
    most: 20e-3,
  }),
} as const;

const results = {
  ...trimResults("Ω"),
  current: { label: "Current as set", symbol: "I", unit: "A", formula: "current" },
  leastCurrent: { label: "Current at the high end", symbol: "I_1", unit: "A", formula: "current" },
  mostCurrent: { label: "Current at the low end", symbol: "I_0", unit: "A", formula: "current" },
  extremeCurrent: { label: "Most current of any unit", symbol: "I_x", unit: "A", formula: "current" },
} as const;

type P = typeof parts;
type C = typeof conditions;
type R = typeof results;
interface State {
  parts: PartValues<P>;
  conditions: ConditionValues<C>;
}

const settingOf = (state: State) => rheostatSetting(state.parts, state.conditions.endResistance);

function analyse(state: State, window: Window | undefined): ResultValues<R> {
  const voltage = state.conditions.controlVoltage;
  const middle = (a: number, b: number) => (voltage === null ? (a + b) / 2 : 2 / (1 / a + 1 / b));
  const figures = trimFigures(settingOf(state), state.conditions, window, middle);
  if (voltage === null) return figures;
  return {
    ...figures,
    current: voltage / figures.value!,
    leastCurrent: voltage / figures.endHigh!,
    mostCurrent: voltage / figures.endLow!,
    extremeCurrent: voltage / figures.extremeLow!,
  };
}

function design({ least, most }: Window, end: number, stocked: number | undefined): PartValues<P> | DesignRefusal {
  const rPot = (most - least) / (1 - end);
  const rFixed = most - rPot;
  if (!(rPot > 0 && rFixed > 0))
    return {
      refused: true,
      field: "least",
      message: `From ${formatQuantity(least, "Ω")} to ${formatQuantity(most, "Ω")} there is no pot and padding: the least must lie below the most, and above what the pot itself leaves at its end.`,
    };
  if (stocked !== undefined && Math.abs(stocked / rPot - 1) > 1e-9)
    return {
      refused: true,
      field: "most",
      message: `A pot of ${formatQuantity(stocked, "Ω")} spans ${formatQuantity(stocked * (1 - end), "Ω")}; from ${formatQuantity(least, "Ω")} that leads to ${formatQuantity(least + stocked * (1 - end), "Ω")}. Ask for that, or leave the pot open.`,
    };
  return { rFixed, rPot };
}

const limits: readonly Limit<P, C, R>[] = [
  ...(knobLimits as unknown as readonly Limit<P, C, R>[]),
  {
    code: "end-unsafe",
    severity: "fault",
    unit: "A",
    source: "trim-derivation",
    template:
      "At the low end a unit may pass {value}, above the {limit} that is safe. Raise the padding: knobs get turned to the stop.",
    check: ({ conditions: { mostCurrent: limit }, results: { extremeCurrent: value } }) =>
      value !== undefined && value > limit ? { value, limit } : undefined,
  },
];

export const rheostat = defineTopology({
  id: "rheostat",
  name: "Rheostat",
  summary: "A pot as a variable resistor with a fixed one in series: sets a current, a time or a frequency.",
  parts,
  conditions,
  targets,
  results,
  analyse: (state, wanted) => analyse(state, windowOf(wanted)),
  design: ({ targets: window, conditions: given, given: decided }) => design(window, given.endResistance, decided.rPot),
  anchors: [],
  curves: [travelCurve<State>(settingOf, { quantity: "Resistance", unit: "Ω" })],
  limits,
  formulas: rheostatFormulas,
  sources,
  network: rheostatNetwork,
  // A resistance that stands in for one of another stage: nothing passes through it.
  joints: {},
  devices: [],
  traits: [
    { label: "Sets", text: "a resistance: current, time or frequency" },
    { label: "Span depends on", text: "the pot's tolerance in full" },
    { label: "Law for equal ratios per degree", text: "logarithmic" },
    { label: "At the low end", text: "the padding alone" },
  ],
  leavesOut: [
    "the wiper's contact resistance and its noise",
    "the tolerance of the law itself, which is wide",
    "temperature coefficients of track and padding",
  ],
});
