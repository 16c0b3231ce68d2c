import { thermalVoltage, roomTemperature } from "../../../../device/constants.ts";
import { formatQuantity } from "../../../../quantity/format.ts";
import { solveBracketed } from "../../../../numeric/solveBracketed.ts";
import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { buttonLatency, edgeShare, slowestEdge, velocityFigures } from "../../model.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { heldWidth, junctionWidth, offNetwork, thresholdAt, unloadedWidth } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type ThresholdState = State<P, C>;

/** How a base-emitter voltage moves with temperature, V/K. From memory. */
const junctionDrift = -2e-3;
/** What is left across a saturated transistor, V. From memory. */
const saturationDrop = 0.2;

/** The base-emitter voltage at the edge of conduction, at the temperature given. */
export const edgeVoltage = (conditions: ConditionValues<C>): number =>
  conditions.baseEmitterVoltage + junctionDrift * (conditions.temperature - roomTemperature);

export function analyse({ parts, conditions }: ThresholdState): ResultValues<R> {
  const { pulseHeight, riseTime, railPositive } = conditions;
  const vbe = edgeVoltage(conditions);
  const threshold = thresholdAt(parts, vbe, 0);
  const off = offNetwork(parts);
  const pulseWidth = vbe > 0 ? heldWidth(parts, pulseHeight, vbe, threshold) : undefined;
  const half = halfCurrent({ parts, conditions });
  const latency =
    conditions.buttonTimeConstant === null || !half
      ? undefined
      : buttonLatency(conditions.buttonTimeConstant, railPositive, half.thresholdHalf);
  const unloaded = vbe > 0 ? unloadedWidth(parts, pulseHeight, threshold) : undefined;
  const slowest = slowestEdge(threshold / (pulseHeight * off.share), off.timeConstant);
  return {
    threshold,
    ...half,
    thresholdDrift: junctionDrift * (1 + parts.ra / parts.rb),
    inputResistance: parts.ra + parts.rb,
    edgeResistance: parts.rs + off.load,
    edgePeak: pulseHeight * off.share * (riseTime === null ? 1 : edgeShare(riseTime, off.timeConstant)),
    ...(pulseWidth !== undefined && { pulseWidth }),
    ...(unloaded !== undefined && { pulseWidthUnloaded: unloaded }),
    ...(slowest !== undefined && { slowestEdge: slowest }),
    ...(latency !== undefined && { buttonLatency: latency }),
    ...velocityFigures(conditions, pulseWidth),
  };
}

/** Threshold and width to half of the saturated collector current; nothing where the rail leaves no collector current. */
function halfCurrent({ parts, conditions }: ThresholdState) {
  const { beta, saturationCurrent, railPositive, pulseHeight, temperature } = conditions;
  const full = (railPositive - saturationDrop) / parts.rc;
  if (!(full > 0)) return undefined;
  const shift = junctionDrift * (temperature - roomTemperature);
  const slopeVoltage = thermalVoltage(temperature);
  // Is at this temperature, so that the base-emitter voltage at room temperature drifts by 2 mV/K.
  const atRoom = thermalVoltage(roomTemperature) * Math.log1p(full / 2 / saturationCurrent) + shift;
  const collector = { slopeVoltage, saturationCurrent: full / 2 / Math.expm1(atRoom / slopeVoltage) };
  if (!(atRoom > 0 && Number.isFinite(collector.saturationCurrent))) return undefined;
  const base = beta === null ? 0 : 1 / beta;
  const law = { slopeVoltage, saturationCurrent: collector.saturationCurrent * base };
  const width = beta === null ? undefined : junctionWidth(parts, pulseHeight, law, (full / 2) * base);
  return {
    thresholdHalf: thresholdAt(parts, atRoom, (full / 2) * base),
    thresholdSaturated: thresholdAt(parts, conditions.baseEmitterSaturated + shift, full * base),
    ...(width !== undefined && { pulseWidthHalf: width }),
  };
}

/** Far above any resistor: the differentiator's own resistor left out. */
const noResistor = 1e12;
const usualCapacitor = 22e-9;

/** Exact RB for the threshold and RD for the width, with the capacitor taken as given. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const fixed = { ra: given.ra ?? 100e3, rc: given.rc ?? 10e3, cd: given.cd ?? usualCapacitor, rs: given.rs ?? 1e3 };
  const vbe = edgeVoltage(conditions);
  if (!(targets.threshold > vbe && vbe > 0)) {
    return {
      refused: true,
      field: "threshold",
      message: `The threshold cannot lie below the base-emitter voltage of ${formatQuantity(Math.max(vbe, 0), "V")}. Raise it.`,
    };
  }
  const rb = fixed.ra / (targets.threshold / vbe - 1);
  // A width that the pulse does not even begin counts as none, so that the sign still tells which way to go.
  const width = (rd: number) => heldWidth({ ...fixed, rb, rd }, conditions.pulseHeight, vbe, targets.threshold) ?? 0;
  const most = width(noResistor);
  if (most === 0) {
    return {
      refused: true,
      field: "threshold",
      message: `A pulse of ${formatQuantity(conditions.pulseHeight, "V")} does not reach a threshold of ${formatQuantity(targets.threshold, "V")} behind the divider. Lower it, or expect a higher pulse.`,
    };
  }
  if (!(most > targets.pulseWidth)) {
    return {
      refused: true,
      field: "pulseWidth",
      message: `The base alone empties ${formatQuantity(fixed.cd, "F")} in ${formatQuantity(most, "s")}, sooner than the width asked for. Take a larger capacitor, or ask for less.`,
    };
  }
  const rd = Math.exp(
    solveBracketed((x) => width(Math.exp(x)) - targets.pulseWidth, Math.log(1e-3), Math.log(noResistor), 1e-16),
  );
  return { ...fixed, rb, rd };
}
