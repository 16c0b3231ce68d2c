import { thermalVoltage } from "../../device/constants.ts";
import { junctionTempco, saturationCurrent } from "../../device/bipolar.ts";
import type { ConditionValues, ResultValues } from "../../stage/values.ts";
import type { conditions, results, sharedBaseConditions } from "./fields.ts";
import type { MirrorPoint, MirrorWorld } from "./model.ts";

export type C = typeof conditions;
export type SharedC = typeof sharedBaseConditions;
export type R = typeof results;

/** A hundredth of the peak current: 40 dB down, where a decay fades into the noise. */
const tailShare = 0.01;

/** What solving the junctions to the last digit leaves of two equal currents, relative. */
const rounding = 1e-11;

/** By how much one ratio lies above another, relative; nothing where only rounding tells them apart. */
function excess(ratio: number, over: number): number {
  const error = ratio / over - 1;
  return Math.abs(error) < rounding ? 0 : error;
}

export type Surroundings = ConditionValues<C> & Partial<Pick<ConditionValues<SharedC>, "outputs" | "baseHelper">>;

export function worldOf(given: Surroundings): MirrorWorld {
  return {
    referenceCurrent: given.referenceCurrent,
    beta: given.beta ?? Infinity,
    earlyVoltage: given.earlyVoltage ?? Infinity,
    mismatch: given.mismatchVoltage + junctionTempco * given.temperatureDifference,
    thermal: thermalVoltage(given.temperature),
    saturation: saturationCurrent(given.temperature),
    supply: given.railPositive - given.outputVoltage,
    seriesResistance: given.seriesResistance,
    outputs: given.outputs ?? 1,
    helper: given.baseHelper === "follower",
  };
}

/** What tells one topology's figures from another's. */
export interface MirrorShape {
  solve(world: MirrorWorld): MirrorPoint;
  /** Ratio that the resistors alone call for. */
  nominal: number;
  /** V from the rail that the output needs to work. */
  compliance(point: MirrorPoint): number;
  /** V across the reference's emitter resistor; undefined where there is none. */
  degeneration?(point: MirrorPoint): number;
  /** The textbook's approximation of the output resistance, Ω. */
  textbook(world: MirrorWorld, point: MirrorPoint): number;
}

/** Every figure of a mirror; those of an active output are left out where it has no voltage to work with. */
export function mirrorFigures(world: MirrorWorld, shape: MirrorShape): ResultValues<R> {
  const { solve, nominal } = shape;
  const point = solve(world);
  const compliance = shape.compliance(point);
  const headroom = world.supply - point.outputCurrent * world.seriesResistance - compliance;
  const always = {
    compliance,
    headroom,
    baseEmitterVoltage: point.baseEmitter,
    ...(shape.degeneration && { degenerationVoltage: shape.degeneration(point) }),
  };
  if (headroom < 0) return always;
  const ratio = point.outputCurrent / world.referenceCurrent;
  const ideal: MirrorWorld = { ...world, beta: Infinity, earlyVoltage: Infinity, mismatch: 0 };
  const ratioOf = (other: MirrorWorld) => solve(other).outputCurrent / other.referenceCurrent;
  const idealRatio = ratioOf(ideal);
  const tailRatio = ratioOf({ ...world, referenceCurrent: tailShare * world.referenceCurrent });
  const textbook = shape.textbook(world, point);
  const resistance = point.outputResistance();
  return {
    ...always,
    outputCurrent: point.outputCurrent,
    ratio,
    ratioError: excess(ratio, nominal),
    baseCurrentError: world.beta === Infinity ? 0 : excess(ratioOf({ ...ideal, beta: world.beta }), idealRatio),
    earlyError:
      world.earlyVoltage === Infinity ? 0 : excess(ratioOf({ ...ideal, earlyVoltage: world.earlyVoltage }), idealRatio),
    mismatchError: world.mismatch === 0 ? 0 : excess(ratio, ratioOf({ ...world, mismatch: 0 })),
    junctionError: excess(idealRatio, nominal),
    ...(resistance < Infinity && { outputResistance: resistance }),
    ...(textbook < Infinity && { textbookOutputResistance: textbook }),
    collectorEmitterVoltage: point.collectorEmitter,
    dissipation: point.collectorEmitter * point.outputCurrent,
    tailError: excess(tailRatio, nominal),
    tailBendDb: (20 / Math.LN10) * Math.abs(Math.log1p(excess(tailRatio, ratio))),
  };
}

/** Output current at another reference current or output voltage; NaN where the output has no voltage to work with. */
export function activeCurrent(world: MirrorWorld, { solve, compliance }: MirrorShape): number {
  const point = solve(world);
  const spare = world.supply - point.outputCurrent * world.seriesResistance - compliance(point);
  return spare < 0 ? Number.NaN : point.outputCurrent;
}
