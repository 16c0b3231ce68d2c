import type { Limit } from "../../stage/topology.ts";
import { crestOf } from "../../stage/signal.ts";
import type { C, P, R } from "./analyse.ts";
import { perCent } from "../../stage/shown.ts";

/** What the rail should stand above the breakdown, V. */
const railMargin = 3;
/** Clock of a shift register over the band wanted of it. */
const clockMargin = 5;
/** Sizes of the rule's error and of the amplifier's share worth a word. */
const [ruleError, quietestRatio, agreed] = [0.1, 20, 3];

/** What the trade warns of in a noise source (trade brief 2.14). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "no-swing",
    severity: "fault",
    unit: "V",
    source: "memory",
    template: "The rails leave {value} of swing, not above {limit}: there is no headroom to speak of. Raise the rails.",
    check: ({ results }) => (results.swing === 0 ? { value: 0, limit: 0 } : undefined),
  },
  {
    code: "no-breakdown",
    severity: "fault",
    unit: "V",
    source: "breakdown",
    template:
      "The rail is {value}, not above the {limit} at which the junction breaks down: no current flows, and there is no noise. Raise the rail, or choose another junction.",
    check: ({ conditions: { railPositive, breakdownVoltage } }) =>
      railPositive <= breakdownVoltage ? { value: railPositive, limit: breakdownVoltage } : undefined,
  },
  {
    code: "rail-near-breakdown",
    severity: "caution",
    unit: "V",
    source: "memory",
    template:
      "The rail stands {value} above the breakdown, less than {limit}: parts at the edge go quiet on a low rail or when warm. Choose a junction that breaks down earlier.",
    check: ({ conditions: { railPositive, breakdownVoltage } }) => {
      const margin = railPositive - breakdownVoltage;
      return margin > 0 && margin < railMargin ? { value: margin, limit: railMargin } : undefined;
    },
  },
  {
    code: "output-clips",
    severity: "caution",
    unit: "V",
    source: "derivation",
    template: "Peaks of {value} (four times RMS) pass the {limit} that the op amps can swing. Lower the gain.",
    check: ({ results }) =>
      results.swing! > 0 && results.peak4Sigma! > results.swing!
        ? { value: results.peak4Sigma!, limit: results.swing! }
        : undefined,
  },
  {
    code: "loud-device-clips",
    severity: "note",
    unit: "V",
    source: "memory",
    template:
      "With a loud device peaks reach {value}, past the {limit} that the op amps can swing: leave room for a trim, or select the device.",
    check: ({ results }) => {
      const peak = crestOf.noise * results.rmsMost!;
      const clips = results.peak4Sigma! > results.swing!;
      return results.swing! > 0 && !clips && peak > results.swing! ? { value: peak, limit: results.swing! } : undefined;
    },
  },
  {
    code: "slow-op-amp",
    severity: "caution",
    unit: "Hz",
    source: "practice",
    template:
      "The gain-bandwidth of {value} is below the {limit} that the larger stage gain needs: the highs are lost. Share the gain more evenly, or take a faster op amp.",
    check: ({ conditions: { gainBandwidth }, results: { gainBandwidthNeeded } }) =>
      gainBandwidth !== null && gainBandwidth < gainBandwidthNeeded!
        ? { value: gainBandwidth, limit: gainBandwidthNeeded! }
        : undefined,
  },
  {
    code: "level-off",
    severity: "caution",
    unit: "dB",
    source: "practice",
    template: "The level is {value} from the one agreed with the board behind, more than {limit}. Set the gain anew.",
    check: ({ conditions: { interfaceLevel }, results: { rms } }) => {
      if (interfaceLevel === null) return undefined;
      const off = Math.abs(20 * Math.log10(rms! / interfaceLevel));
      return off > agreed ? { value: off, limit: agreed } : undefined;
    },
  },
  {
    code: "supply-shared",
    severity: "caution",
    unit: "",
    source: "practice",
    template:
      "A gain of {value}, above {limit}, stands on a supply without an RC of its own: what other boards leave on the rail is heard. Filter the supply.",
    check: ({ conditions: { supplyFilter }, results: { gain } }) =>
      supplyFilter === "shared" && gain! > 1 ? { value: gain!, limit: 1 } : undefined,
  },
  {
    code: "amplifier-heard",
    severity: "note",
    unit: "dB",
    source: "derivation",
    template:
      "The junction stands {value} above the amplifier's own noise, less than {limit}: part of the level is not the junction's. Lower R_1, or choose a louder junction.",
    check: ({ results: { overAmplifierDb } }) =>
      overAmplifierDb! < quietestRatio ? { value: overAmplifierDb!, limit: quietestRatio } : undefined,
  },
  {
    code: "short-hit",
    severity: "note",
    unit: "",
    shown: perCent,
    source: "derivation",
    template:
      "For hits this short the rule for the spread is {value} off, more than {limit}: the exact figure stands beside it.",
    check: ({ results: { hitSpread, hitSpreadRule } }) => {
      const off = Math.abs(hitSpreadRule! / hitSpread! - 1);
      return off > ruleError ? { value: off, limit: ruleError } : undefined;
    },
  },
  {
    code: "slow-clock",
    severity: "caution",
    unit: "Hz",
    source: "practice",
    template:
      "The register is clocked at {value}, below {limit} (five times the band limit): its noise is not flat. Raise the clock.",
    check: ({ conditions: { clockFrequency, bandLimit } }) =>
      clockFrequency !== null && clockFrequency < clockMargin * bandLimit
        ? { value: clockFrequency, limit: clockMargin * bandLimit }
        : undefined,
  },
  {
    code: "audible-loop",
    severity: "caution",
    unit: "s",
    source: "practice",
    template:
      "The pseudo-noise repeats after {value}, less than {limit}: the loop is heard. Take a longer register, or a slower clock.",
    check: ({ results: { repeatPeriod } }) =>
      repeatPeriod !== undefined && repeatPeriod < 1 ? { value: repeatPeriod, limit: 1 } : undefined,
  },
];
