import type { Limit } from "../../stage/topology.ts";
import type { Parts } from "../../stage/values.ts";
import type { C, R } from "./figures.ts";
import { perCent } from "../../stage/shown.ts";

/** Above this VCE without degeneration the Early effect alone passes 15 % at a usual 50 V. */
const mostCollectorVoltage = 10;
/** VBE of two transistors that were not chosen to match differ by this and more. */
const unmatched = 2e-3;
const leastDegeneration = 0.1;
const leastHeadroom = 0.5;
const mostBendDb = 1;
const mostError = 0.05;

const saturates: Limit<Parts, C, R> = {
  code: "output-saturates",
  severity: "fault",
  unit: "V",
  source: "memory",
  template:
    "The output needs {limit} more than it has: its voltage to spare is {value}, and its current is no longer a copy. Lower the current, the resistors, or the output's voltage.",
  check: ({ results }) => (results.headroom! < 0 ? { value: results.headroom!, limit: -results.headroom! } : undefined),
};

const littleHeadroom: Limit<Parts, C, R> = {
  code: "little-headroom",
  severity: "caution",
  unit: "V",
  source: "practice",
  template:
    "Only {value} is left before the output saturates; keep {limit}. Smaller emitter or series resistors leave more.",
  check: ({ results }) =>
    results.headroom! >= 0 && results.headroom! < leastHeadroom
      ? { value: results.headroom!, limit: leastHeadroom }
      : undefined,
};

const bendsDecay: Limit<Parts, C, R> = {
  code: "bends-decay",
  severity: "caution",
  unit: "dB",
  source: "mirror-derivation",
  template:
    "From the peak to a hundredth of it the ratio changes by {value}, more than {limit}: the decay is bent, and its times to −20 dB and −60 dB disagree. Lower the voltage across the output transistor, or take a Wilson mirror.",
  check: ({ results }) =>
    results.tailBendDb !== undefined && results.tailBendDb > mostBendDb
      ? { value: results.tailBendDb, limit: mostBendDb }
      : undefined,
};

const errorUntrimmed: Limit<Parts, C, R> = {
  code: "error-untrimmed",
  severity: "caution",
  unit: "",
  shown: perCent,
  source: "practice",
  template:
    "The ratio is off by {value} of what the resistors call for, more than {limit}, and nothing downstream trims it. Fit a trim, or take a mirror of less error.",
  check: ({ results, conditions }) => {
    const error = results.ratioError;
    if (conditions.trim !== "none" || error === undefined || Math.abs(error) <= mostError) return undefined;
    return { value: error, limit: Math.sign(error) * mostError };
  },
};

/** Where there is an emitter resistor, `degeneration` is the voltage across it; elsewhere 0. */
const unmatchedPair: Limit<Parts, C, R> = {
  code: "unmatched-pair",
  severity: "caution",
  unit: "V",
  source: "mirror-derivation",
  template:
    "Only {value} lies across the emitter resistor, below {limit}, and the pair is not matched: {detail}. Take two transistors in one package, or larger emitter resistors.",
  check: ({ results, conditions }) => {
    const across = results.degenerationVoltage ?? 0;
    if (Math.abs(conditions.mismatchVoltage) < unmatched || across >= leastDegeneration) return undefined;
    const share = results.mismatchError;
    const detail =
      share === undefined ? "its mismatch passes on to the ratio" : `its mismatch moves the ratio by ${percent(share)}`;
    return { value: across, limit: leastDegeneration, detail };
  },
};

const highCollectorVoltage: Limit<Parts, C, R> = {
  code: "high-collector-voltage",
  severity: "caution",
  unit: "V",
  source: "early-note",
  template:
    "{value} lies across the output transistor without degeneration, above {limit}: {detail}. Put a resistor in the output, or emitter resistors.",
  check: ({ results, conditions }) => {
    const { collectorEmitterVoltage: across, earlyError } = results;
    if (conditions.earlyVoltage === null || across === undefined || (results.degenerationVoltage ?? 0) > 0)
      return undefined;
    if (across <= mostCollectorVoltage) return undefined;
    return {
      value: across,
      limit: mostCollectorVoltage,
      detail: `the Early effect adds ${percent(earlyError!)} to the current`,
    };
  },
};

const percent = (share: number) => `${(100 * share).toPrecision(3)} %`;

/** Warnings of trade brief 2.5 that every mirror shares. */
export const commonLimits = [saturates, littleHeadroom, errorUntrimmed, unmatchedPair];
/** A Wilson mirror cancels the Early effect of its output, at the peak as at the tail. */
export const pairLimits = [...commonLimits, bendsDecay, highCollectorVoltage];
