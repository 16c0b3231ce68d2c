import type { Limit } from "../../stage/topology.ts";
import type { Parts, ResultValues } from "../../stage/values.ts";
import type { conditions, driverConditions, driverResults, resistorResults, results } from "./fields.ts";
import { mostBias } from "./model.ts";

type Any<R extends typeof results> = Limit<Parts, typeof conditions, R>;
type DriverLimit = Limit<Parts, typeof driverConditions, typeof driverResults>;

const mostFault = 1.5e-3;
const shallowestFloorDb = -60;
const leastHeadroom = 0.5;
const mostReverse = 5;
const audibleDelay = 20e-6;

const sharedFigures = (given: unknown) => given as ResultValues<typeof results>;

const faultCurrent: Any<typeof results> = {
  code: "fault-current",
  severity: "caution",
  unit: "A",
  source: "dual-ota",
  template:
    "With the op amp stuck high {value} flows, above {limit}; the bias pin stands 2 mA. Take a larger resistor, or limit the current at the mirror's output.",
  check: (context) => {
    const value = sharedFigures(context.results).faultCurrent!;
    return value > mostFault ? { value, limit: mostFault } : undefined;
  },
};

const largePeak: Any<typeof results> = {
  code: "peak-over-plan",
  severity: "caution",
  unit: "A",
  source: "practice",
  template:
    "The peak is {value}; plan for {limit} at most, half of what the bias pin stands. Take a larger resistor, or lower the control voltage.",
  check: (context) => {
    const value = sharedFigures(context.results).outputCurrent!;
    return value > mostBias * (1 + 1e-9) ? { value, limit: mostBias } : undefined;
  },
};

const shallowFloor: Any<typeof results> = {
  code: "shallow-floor",
  severity: "caution",
  unit: "dB",
  source: "practice",
  template:
    "At rest the current lies {value} under its peak, less deep than {limit}: the voice bleeds. Lower the offset or the rest voltage.",
  check: (context) => {
    const value = sharedFigures(context.results).floorDb;
    return value !== undefined && value > shallowestFloorDb ? { value, limit: shallowestFloorDb } : undefined;
  },
};

export const driverLimits: readonly DriverLimit[] = [
  faultCurrent,
  largePeak,
  shallowFloor,
  {
    code: "cannot-follow",
    severity: "fault",
    unit: "V",
    source: "converter-derivation",
    template:
      "The control voltage peaks at {value} and is followed up to {limit} only: the op amp or the transistor saturates, and the top of the envelope is cut off. Lower the voltage, or raise the rail.",
    check: ({ conditions, results: { reach } }) =>
      conditions.controlVoltage > reach! * (1 + 1e-12)
        ? { value: conditions.controlVoltage, limit: reach! }
        : undefined,
  },
  {
    code: "little-headroom",
    severity: "caution",
    unit: "V",
    source: "practice",
    template:
      "Only {value} is left across the transistor at the peak; keep {limit}. Lower the control voltage, or raise the rail.",
    check: ({ results: { headroom } }) =>
      headroom! < leastHeadroom ? { value: headroom!, limit: leastHeadroom } : undefined,
  },
  {
    code: "negative-envelope",
    severity: "caution",
    unit: "V",
    source: "practice",
    template:
      "The envelope rests at {value}, below {limit}: the op amp runs to its negative swing and must come back before the next hit. Let the envelope rest at ground.",
    check: ({ conditions: { controlRest } }) => (controlRest < 0 ? { value: controlRest, limit: 0 } : undefined),
  },
  {
    code: "slow-recovery",
    severity: "caution",
    unit: "s",
    source: "practice",
    template:
      "Coming back from its negative swing takes the op amp {value}, more than {limit}: the hit is late. Take a faster one.",
    check: ({ conditions, results: { recoveryTime } }) =>
      conditions.controlRest < 0 && recoveryTime !== undefined && recoveryTime > audibleDelay
        ? { value: recoveryTime, limit: audibleDelay }
        : undefined,
  },
  {
    code: "reverse-base-emitter",
    severity: "caution",
    unit: "V",
    source: "memory",
    template: "The base is driven {value} in reverse, above {limit}, which ages it. Fit a diode from emitter to base.",
    check: ({ results: { reverseVoltage } }) =>
      reverseVoltage !== undefined && reverseVoltage > mostReverse
        ? { value: reverseVoltage, limit: mostReverse }
        : undefined,
  },
];

export const resistorLimits: readonly Limit<Parts, typeof conditions, typeof resistorResults>[] = [
  faultCurrent,
  largePeak,
  {
    ...shallowFloor,
    code: "cannot-reach-zero",
    template:
      "At rest the current lies only {value} under its peak, less deep than {limit}: from an envelope that rests near ground a resistor cannot shut the pin off. Let the envelope rest at the negative rail, or take the op amp and transistor.",
  },
  {
    code: "no-current",
    severity: "fault",
    unit: "V",
    source: "converter-derivation",
    template:
      "Between control and bias pin lie {value}; the pin takes current only above {limit}. Raise the control voltage.",
    check: ({ results: { headroom } }) => (headroom! <= 0 ? { value: headroom!, limit: 0 } : undefined),
  },
];
