import { bipolarSlopes } from "../../device/bipolar.ts";
import { solveBracketed } from "../../numeric/solveBracketed.ts";
import { solveIncreasing } from "../../numeric/solveIncreasing.ts";
import { pairResistance, wilsonResistance } from "./outputResistance.ts";

/**
 * Mirrors are solved from their device equations. A transistor carries Ic = Is·exp(VBE/VT)·(1 + VCE/VA) and draws
 * Ib = Ic/β, with β that of its own operating point; every voltage is counted downwards from the positive rail.
 */
export interface MirrorWorld {
  /** A, taken out of the reference node. */
  referenceCurrent: number;
  /** Infinity for an ideal transistor. */
  beta: number;
  /** V; Infinity for an ideal transistor. */
  earlyVoltage: number;
  /** V by which the output transistor's base-emitter voltage for the same current is smaller. */
  mismatch: number;
  /** V, kT/e. */
  thermal: number;
  /** A. */
  saturation: number;
  /** V from the positive rail down to what the output feeds. */
  supply: number;
  /** Ω between collector and what the output feeds. */
  seriesResistance: number;
  /** Equal outputs on the one reference. */
  outputs: number;
  /** A follower feeds the bases. */
  helper: boolean;
}

export interface MirrorPoint {
  /** A, of one output. */
  outputCurrent: number;
  /** V from the rail to the base line. */
  baseLine: number;
  /** VBE of the reference transistor, V. */
  baseEmitter: number;
  /** VCE of the output transistor, V. */
  collectorEmitter: number;
  /** Ω, slope of output voltage over output current; computed when asked for, Infinity for ideal transistors. */
  outputResistance(): number;
}

/** VBE taken for the follower that feeds the bases, V: it only moves the reference transistor's VCE. */
const helperVoltage = 0.6;
/** No output is computed beyond this current, A: the transistor is long saturated there. */
const mostCurrent = 1e3;
/** The residual of every solution is checked against this, relative to the reference current… */
const residualAllowed = 1e-10;

/**
 * Simple mirror (both resistors 0) or degenerated mirror, exactly.
 *
 * @param r1 Ω from the rail to the reference emitter
 * @param r2 Ω from the rail to each output emitter
 */
export function solvePair(world: MirrorWorld, r1: number, r2: number): MirrorPoint {
  const { referenceCurrent, beta, earlyVoltage, mismatch, thermal, outputs, helper } = world;
  const logSaturation = Math.log(world.saturation);
  const emitterShare = 1 + 1 / beta;
  const extra = helper ? helperVoltage : 0;
  const baseShare = 1 / beta / (helper ? beta + 1 : 1);

  const at = (u: number) => {
    const baseEmitter = thermal * (u - logSaturation);
    const transport = Math.exp(u);
    const current = transport * (1 + (baseEmitter + extra) / earlyVoltage);
    const slope = current + (transport * thermal) / earlyVoltage;
    const baseLine = baseEmitter + r1 * emitterShare * current;
    const output = outputOf(world, r2, baseLine + mismatch);
    const total = current + (current + outputs * output.current) * baseShare;
    const outputSlope = output.slope * (thermal + r1 * emitterShare * slope);
    const totalSlope = slope + (slope + outputs * outputSlope) * baseShare;
    return { baseEmitter, baseLine, transport, current, output, total, totalSlope };
  };
  const start = Math.log(referenceCurrent);
  const solution = at(
    solveIncreasing(
      (u) => {
        const { total, totalSlope } = at(u);
        return [Math.log(total / referenceCurrent), totalSlope / total];
      },
      start,
      start - 60,
      start + 1,
    ),
  );
  checkResidual(solution.total / referenceCurrent - 1, 1 + (solution.baseLine - solution.baseEmitter) / thermal);
  const { baseEmitter, baseLine, output } = solution;
  const slopesOf = (collector: number, transport: number) =>
    bipolarSlopes({ collector, transport, base: collector / beta }, world);
  return {
    outputCurrent: output.current,
    baseLine,
    baseEmitter,
    collectorEmitter: world.supply - output.current * (r2 * emitterShare + world.seriesResistance),
    outputResistance: () =>
      pairResistance(slopesOf(solution.current, solution.transport), slopesOf(output.current, output.transport), {
        r1,
        r2,
        seriesResistance: world.seriesResistance,
        outputs,
        helperGain: helper ? beta + 1 : 1,
      }),
  };
}

/** Collector current of an output whose base lies `drive` below the rail, mismatch included, and its slope over drive. */
function outputOf(world: MirrorWorld, r2: number, drive: number) {
  const { beta, earlyVoltage, thermal, supply, seriesResistance } = world;
  const logSaturation = Math.log(world.saturation);
  const emitterResistance = r2 * (1 + 1 / beta);
  // VCE = supply − Ic·(emitter and series resistance), so Ic is explicit in the transport current.
  const open = Math.max(1 + supply / earlyVoltage, 0);
  const loading = (emitterResistance + seriesResistance) / earlyVoltage;
  const collector = (u: number) => {
    const transport = Math.exp(u);
    const divisor = 1 + transport * loading;
    const current = (transport * open) / divisor;
    return { transport, current, slope: current / divisor };
  };
  const most = Math.log(mostCurrent);
  const unloaded = Math.min(drive / thermal + logSaturation, most);
  if (emitterResistance === 0) {
    const { transport, current, slope } = collector(unloaded);
    return { transport, current, slope: unloaded < most ? slope / thermal : 0 };
  }
  const residual = (u: number) => {
    const { current, slope } = collector(u);
    return [
      thermal * (u - logSaturation) + emitterResistance * current - drive,
      thermal + emitterResistance * slope,
    ] as const;
  };
  // Without Early effect w = R·Ic/VT solves w + ln w = a; w ≈ a − ln a above 1 and exp(a) below.
  const a = unloaded + Math.log((emitterResistance * Math.max(open, 1)) / thermal);
  const start = a > 1 ? unloaded - (a - Math.log(a - Math.log(a))) : unloaded;
  const u = solveIncreasing(residual, start, unloaded - Math.max(residual(unloaded)[0], 0) / thermal - 1, unloaded);
  const { transport, current, slope } = collector(u);
  return { transport, current, slope: u < most ? slope / (thermal + emitterResistance * slope) : 0 };
}

/** Wilson mirror of three transistors, exactly: the pair is closed by the output transistor's base. */
export function solveWilson(world: MirrorWorld): MirrorPoint {
  const { referenceCurrent, beta, earlyVoltage, mismatch, thermal } = world;
  const logSaturation = Math.log(world.saturation);
  const at = (u: number) => {
    const baseEmitter = thermal * (u - logSaturation);
    const copied = Math.exp(u + mismatch / thermal);
    const diode = copied * (1 + baseEmitter / earlyVoltage);
    // Reference node: Ic1 = Iref − Io/β. Base line: Io·(1 + 1/β) = Ic2 + (Ic1 + Ic2)/β.
    const outputCurrent = (diode * (1 + 1 / beta) + referenceCurrent / beta) / (1 + 1 / beta + 1 / beta ** 2);
    const reference = referenceCurrent - outputCurrent / beta;
    const collectorEmitter = world.supply - baseEmitter - outputCurrent * world.seriesResistance;
    const transport = outputCurrent / (1 + Math.max(0, collectorEmitter) / earlyVoltage);
    const outer = thermal * (Math.log(transport) - logSaturation);
    const wanted = Math.exp(u) * (1 + (baseEmitter + outer) / earlyVoltage);
    const excess = (wanted - reference) / referenceCurrent;
    return { u, baseEmitter, copied, diode, outputCurrent, reference, collectorEmitter, transport, excess };
  };
  const most = Math.log(referenceCurrent) + 1;
  const solution = at(solveBracketed((u) => at(u).excess, most - 60, most));
  checkResidual(solution.excess);
  const { outputCurrent, baseEmitter, collectorEmitter } = solution;
  const slopesOf = (collector: number, transport: number) =>
    bipolarSlopes({ collector, transport, base: collector / beta }, world);
  return {
    outputCurrent,
    baseLine: baseEmitter,
    baseEmitter,
    collectorEmitter,
    outputResistance: () =>
      wilsonResistance(
        slopesOf(solution.reference, Math.exp(solution.u)),
        slopesOf(solution.diode, solution.copied),
        slopesOf(outputCurrent, solution.transport),
        world.seriesResistance,
      ),
  };
}

/** …times how many times more steeply than the solved logarithm the sum may move. */
function checkResidual(residual: number, steepness = 1): void {
  if (!(Math.abs(residual) <= residualAllowed * steepness))
    throw new Error(`mirror: the currents at the reference node are off balance by ${residual} of the reference`);
}
