import { solvedVoltage } from "../../device/seriesExponential.ts";
import { gaussianDensity, shareAbove } from "../../numeric/gaussianTail.ts";
import { ruleNodes } from "../../numeric/integrate.ts";
import { solveBracketed } from "../../numeric/solveBracketed.ts";

/** The cell with a collector resistor to a stiff supply, at low frequency: the transport model of the transistor. */
export interface Cell {
  /** Ω in series with the base, source included. */
  base: number;
  /** Ω from base to ground. */
  toGround: number;
  /** Ω from the collector to the supply. */
  collector: number;
  supply: number;
  beta: number;
  reverseBeta: number;
  saturationCurrent: number;
  thermalVoltage: number;
}

export interface CellPoint {
  /** Voltage in front of the base resistor, the input capacitor's already taken off. */
  drive: number;
  /** d(drive)/d(base voltage). */
  slope: number;
  /** Through the base resistor, A. */
  current: number;
  collector: number;
}

/**
 * Everything at a base voltage. IF = Is(e^(vb/VT) − 1) and IR = Is(e^(vbc/VT) − 1) give Ic = IF − (1 + 1/βR)·IR and
 * Ib = IF/β + IR/βR; (V − vc)/Rc = Ic is one exponential equation for vbc.
 */
export function pointAt(cell: Cell, vb: number): CellPoint {
  const { saturationCurrent: is, thermalVoltage: vt, collector: rc, beta, reverseBeta } = cell;
  const forward = is * Math.expm1(vb / vt);
  const scale = rc * is * (1 + 1 / reverseBeta);
  const vbc = solvedVoltage(rc * forward - cell.supply + vb, scale, vt);
  const current = vb / cell.toGround + forward / beta + (is * Math.expm1(vbc / vt)) / reverseBeta;
  const gf = (is / vt) * Math.exp(vb / vt);
  const follows = (rc * gf + 1) / (1 + (scale / vt) * Math.exp(vbc / vt));
  const gr = ((is / vt) * Math.exp(vbc / vt) * follows) / reverseBeta;
  return {
    drive: vb + cell.base * current,
    slope: 1 + cell.base * (1 / cell.toGround + gf / beta + gr),
    current,
    collector: vb - vbc,
  };
}

/** Gaussian drive is followed to this many standard deviations: what lies beyond is 10⁻¹⁶. */
const reach = 8.3;
/** And this far out its density is not worth an exponential. */
const nothing = 9;

/** Points of the quadrature, in columns: the sums below run over hundreds of them, a dozen times. */
interface Columns {
  drive: number[];
  current: number[];
  collector: number[];
  /** Weight times slope: the stretch of drive a point stands for, in the fine rule and in the coarse one. */
  fine: number[];
  coarse: number[];
}

/** The base voltage at a drive: the drive rises with it, at least as fast as the base voltage itself. */
function baseVoltageAt(cell: Cell, drive: number): number {
  const most = Math.max(0, drive) + cell.thermalVoltage;
  const least = Math.min(0, drive) - cell.thermalVoltage;
  // Above about 40 VT per decade of current nothing sensible flows; the exponential must not overflow in the search.
  const bound = Math.min(most, cell.thermalVoltage * Math.log1p(1e3 / cell.saturationCurrent));
  if (pointAt(cell, bound).drive <= drive) return bound;
  return solveBracketed((vb) => pointAt(cell, vb).drive - drive, least, bound, 1e-12);
}

/** Share of the drive's deviation that a panel may miss of its own stretch of drive. */
const resolved = 1e-9;
/** Deviations that a panel may span: the rule is exact to rounding on a Gaussian so wide. */
const widest = 2;
/** Enough for the sharpest corner; past either bound rounding, not the rule, keeps a panel from adding up. */
const mostHalvings = 30;
const mostPanels = 240;

/**
 * Quadrature over the base voltage instead of the drive: the drive is an explicit, rising function of it. Where the
 * transistor turns on or saturates the drive moves by volts within millivolts of the base, so the stretch is halved until
 * the rule adds each panel's slope up to its known stretch of drive, and no panel spans more than two deviations.
 */
function columnsFor(cell: Cell, sigma: number): Columns {
  const [low, high] = [baseVoltageAt(cell, -2 * reach * sigma), baseVoltageAt(cell, reach * sigma)];
  const columns: Columns = { drive: [], current: [], collector: [], fine: [], coarse: [] };
  const cover = (from: number, to: number, start: number, end: number, halvings: number): void => {
    const middle = (from + to) / 2;
    const halve = () => {
      const at = pointAt(cell, middle).drive;
      cover(from, middle, start, at, halvings + 1);
      cover(middle, to, at, end, halvings + 1);
    };
    if (end - start > widest * sigma && halvings < mostHalvings) return halve();
    const panel = ruleNodes(from, to).map((node) => ({ node, point: pointAt(cell, node.x) }));
    let spans = 0;
    for (const { node, point } of panel) spans += node.weight * point.slope;
    const missed = Math.abs(spans - (end - start)) > resolved * sigma;
    if (missed && halvings < mostHalvings && columns.drive.length < 15 * mostPanels) return halve();
    for (const { node, point } of panel) {
      columns.drive.push(point.drive);
      columns.current.push(point.current);
      columns.collector.push(point.collector);
      columns.fine.push(node.weight * point.slope);
      columns.coarse.push(node.coarse * point.slope);
    }
  };
  cover(low, high, pointAt(cell, low).drive, pointAt(cell, high).drive, 0);
  return columns;
}

/** What the two quadrature rules may differ by, relative: the finer one is then far closer. */
const settled = 1e-6;

export interface Average {
  /** Volts on the input capacitor. */
  selfBias: number;
  mean: number;
  rms: number;
  /** Share of the time with the collector below half of the supply. */
  duty: number;
  /** Magnitude. */
  correlation: number;
}

/**
 * Averages under Gaussian drive, exact for the static transistor: the self-bias is the capacitor voltage at which the mean
 * current into the base network vanishes; mean, deviation and correlation of the collector follow.
 *
 * @throws RangeError where the quadrature does not settle
 */
export function averageOf(cell: Cell, sigma: number): Average {
  const { drive, current, collector, fine, coarse } = columnsFor(cell, sigma);
  const density = (i: number, bias: number) => {
    const z = (drive[i]! + bias) / sigma;
    return Math.abs(z) > nothing ? 0 : gaussianDensity(z) / sigma;
  };
  const meanCurrent = (bias: number) => {
    let sum = 0;
    for (let i = 0; i < drive.length; i++) sum += fine[i]! * density(i, bias) * current[i]!;
    return sum;
  };
  // A rectifying base charges the capacitor one way only; at `reach` the base is never driven on.
  const selfBias = meanCurrent(0) <= 0 ? 0 : solveBracketed(meanCurrent, 0, reach * sigma, 1e-14);
  let [total, check, first, second, cross] = [0, 0, 0, 0, 0];
  // Powers about the off state, so that no digits are lost where the collector hardly moves.
  const off = collector[0]!;
  for (let i = 0; i < drive.length; i++) {
    const p = density(i, selfBias);
    const weight = fine[i]! * p;
    const moved = collector[i]! - off;
    total += weight;
    check += coarse[i]! * p;
    first += weight * moved;
    second += weight * moved * moved;
    cross += weight * moved * (drive[i]! + selfBias);
  }
  if (!(Math.abs(total - 1) < settled && Math.abs(check - 1) < 1e3 * settled))
    throw new RangeError(`averageOf: the weights add to ${total} and ${check} instead of 1`);
  const moved = first / total;
  const rms = Math.sqrt(Math.max(0, second / total - moved * moved));
  return {
    selfBias,
    mean: off + moved,
    rms,
    duty: dutyOf(cell, sigma, selfBias),
    correlation: rms > 0 ? Math.min(1, Math.abs(cross / total) / (sigma * rms)) : 0,
  };
}

function dutyOf(cell: Cell, sigma: number, selfBias: number): number {
  const above = (vb: number) => pointAt(cell, vb).collector - cell.supply / 2;
  const [low, high] = [baseVoltageAt(cell, -2 * reach * sigma), baseVoltageAt(cell, reach * sigma)];
  if (!(above(low) > 0 && above(high) < 0)) return 0;
  const turns = solveBracketed(above, low, high, 1e-14);
  return shareAbove((pointAt(cell, turns).drive + selfBias) / sigma);
}

/** What the collector keeps when saturated, V. Common practice. */
const saturationDrop = 0.05;

/** Drive that turns the cell on, by the simple law: VBE + (Venv/(2·Rc·β) + VBE/Rb)·Ri. */
export function onVoltage(
  vbe: number,
  supply: number,
  collector: number,
  beta: number,
  toGround: number,
  base: number,
) {
  return vbe + (supply / (2 * collector * beta) + vbe / toGround) * base;
}

/** Output of the simple law, (Venv − 0.05)·√(d(1 − d)): a switch that is on for the share d of the time. */
export function switchedRms(supply: number, duty: number): number {
  return Math.max(0, supply - saturationDrop) * Math.sqrt(duty * (1 - duty));
}
