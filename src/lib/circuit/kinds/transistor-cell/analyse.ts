import { crestOf } from "../../stage/signal.ts";
import { thermalVoltage } from "../../device/constants.ts";
import { shareAbove } from "../../numeric/gaussianTail.ts";
import { solveBracketed } from "../../numeric/solveBracketed.ts";
import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../stage/topology.ts";
import type { PartValues, ResultValues, State } from "../../stage/values.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { averageOf, onVoltage, pointAt, switchedRms, type Average, type Cell } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type CellState = State<P, C>;

function cellOf({ parts, conditions }: CellState, supply: number, collector: number): Cell {
  return {
    base: parts.ri + conditions.sourceResistance,
    toGround: parts.rb,
    collector,
    supply,
    beta: conditions.beta,
    reverseBeta: conditions.reverseBeta,
    saturationCurrent: conditions.saturationCurrent,
    thermalVoltage: thermalVoltage(conditions.temperature),
  };
}

/** Share of the envelope, and of a tenth of a volt, to which the collector's mean is found: far below what any figure shows. */
const settled = 1e-9;

/**
 * Averages with the output loading the collector: above the output's corner C_o stands at the collector's mean, so the
 * collector sees R_c to the envelope and R_o to that mean. The mean is found by the secant method, whose first step takes
 * the mean to follow the supply in proportion.
 */
export function loadedAverage(state: CellState, control: number): Average & { cell: Cell } {
  const { rc, ro } = state.parts;
  const collector = 1 / (1 / rc + 1 / ro);
  const share = rc / (ro + rc);
  const at = (mean: number) => {
    const cell = cellOf(state, control + share * (mean - control), collector);
    return { ...averageOf(cell, state.conditions.sourceRms), cell };
  };
  let x0 = control;
  let got = at(x0);
  let f0 = got.mean - x0;
  let x1 = control > 0 ? Math.max(0, x0 + f0 / (1 - share * (got.mean / control))) : got.mean;
  for (let step = 0; step < 20 && Math.abs(f0) > settled * (control + 0.1); step++) {
    got = at(x1);
    const f1 = got.mean - x1;
    if (Math.abs(f1) <= settled * (control + 0.1) || f1 === f0) break;
    // The collector's mean never lies below ground, whatever the secant says.
    const next = Math.max(0, x1 - (f1 * (x1 - x0)) / (f1 - f0));
    [x0, f0, x1] = [x1, f1, next];
  }
  return got;
}

/** The output alone, for curves and sizing. */
export const outputAt = (state: CellState, control = state.conditions.controlVoltage): number =>
  loadedAverage(state, control).rms;

export function analyse(state: CellState): ResultValues<R> {
  const { parts, conditions } = state;
  const { controlVoltage, sourceRms } = conditions;
  const got = loadedAverage(state, controlVoltage);
  const bleed = outputAt(state, conditions.controlRest);
  const base = parts.ri + conditions.sourceResistance;
  const drawn = (controlVoltage - got.mean) / parts.rc;
  const envelopeLoad = controlVoltage > 0 && drawn > 0 ? controlVoltage / drawn : undefined;
  const { dischargeResistance } = conditions;
  return {
    outputRms: got.rms,
    outputPeak: swingOf(got, sourceRms),
    duty: got.duty,
    selfBias: got.selfBias,
    thump: got.mean,
    correlation: got.correlation,
    inverting: 1,
    ...(envelopeLoad !== undefined && { envelopeLoad }),
    ...(envelopeLoad !== undefined &&
      dischargeResistance !== null && { decayShare: envelopeLoad / (envelopeLoad + dischargeResistance) }),
    ...simpleLaw(state, got),
    bleedRms: bleed,
    ...(bleed > 0 && got.rms > 0 && { bleedDb: 20 * Math.log10(bleed / got.rms) }),
    baseLowest: ((-crestOf.noise * sourceRms - got.selfBias) * parts.rb) / (parts.rb + base),
    inputCorner: 1 / (2 * Math.PI * parts.ci * (base + parts.rb)),
    outputCorner: 1 / (2 * Math.PI * parts.co * (parts.rc + parts.ro)),
  };
}

function simpleLaw({ parts, conditions }: CellState, got: Average): ResultValues<R> {
  const { controlVoltage, baseEmitterVoltage, beta, sourceRms, sourceResistance } = conditions;
  const on = onVoltage(baseEmitterVoltage, controlVoltage, parts.rc, beta, parts.rb, parts.ri + sourceResistance);
  const outputLaw = switchedRms(controlVoltage, got.duty);
  return {
    onVoltage: on,
    dutyLaw: shareAbove((on + got.selfBias) / sourceRms),
    outputLaw,
    ...(got.rms > 0 && { lawError: outputLaw / got.rms - 1 }),
  };
}

/** Between the collector at a drive of minus and plus four standard deviations. */
function swingOf({ cell, selfBias }: Average & { cell: Cell }, sigma: number): number {
  const collectorAt = (drive: number) => {
    const most = cell.thermalVoltage * Math.log1p(1e3 / cell.saturationCurrent);
    const [low, high] = [Math.min(drive, 0) - 0.1, Math.min(most, Math.max(drive, 0) + 0.1)];
    const off = (vb: number) => pointAt(cell, vb).drive - drive;
    return pointAt(cell, off(high) <= 0 ? high : solveBracketed(off, low, high, 1e-12)).collector;
  };
  return collectorAt(-crestOf.noise * sigma - selfBias) - collectorAt(crestOf.noise * sigma - selfBias);
}

/** Resistances tried for the base resistor, Ω. */
const [leastRb, mostRb, tried] = [1e3, 1e8, 21];

/** R_b for the output level: a smaller one empties the input capacitor faster and keeps the cell on for longer. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const fixed = {
    ci: given.ci ?? 1e-6,
    ri: given.ri ?? 10e3,
    rc: given.rc ?? 10e3,
    co: given.co ?? 10e-9,
    ro: given.ro ?? 1e6,
  };
  const output = (x: number) => outputAt({ parts: { ...fixed, rb: Math.exp(x) }, conditions });
  const step = Math.log(mostRb / leastRb) / (tried - 1);
  let most = 0;
  let [x, level] = [Math.log(mostRb), output(Math.log(mostRb))];
  for (let k = 1; k < tried; k++) {
    const next = Math.log(mostRb) - k * step;
    const got = output(next);
    most = Math.max(most, level, got);
    if ((level - targets.outputRms) * (got - targets.outputRms) <= 0) {
      const root = solveBracketed((y) => output(y) - targets.outputRms, next, x, 1e-16);
      return { ...fixed, rb: Math.exp(root) };
    }
    [x, level] = [next, got];
  }
  return {
    refused: true,
    field: "outputRms",
    message:
      targets.outputRms > most
        ? `At ${formatQuantity(conditions.controlVoltage, "V")} of envelope and this drive the cell gives ${formatQuantity(most, "V")} at most. Ask for less, or drive it harder.`
        : `Even with hardly any bias the cell gives more than ${formatQuantity(targets.outputRms, "V")}. Ask for more, or lower the envelope.`,
  };
}
