import type { BipolarSlopes } from "../../device/bipolar.ts";

/**
 * Small-signal output resistances at the operating point, in ohms, from node equations. The output alone is moved; the
 * reference is an ideal current source. Signs: voltages from the rail downwards.
 */

interface PairSurroundings {
  r1: number;
  r2: number;
  seriesResistance: number;
  outputs: number;
  /** 1, or β + 1 where a follower feeds the bases. */
  helperGain: number;
}

/** Simple and degenerated mirror, with a base line that is free to move. */
export function pairResistance(
  reference: BipolarSlopes,
  output: BipolarSlopes,
  { r1, r2, seriesResistance, outputs, helperGain }: PairSurroundings,
): number {
  if (output.output === 0) return Infinity;
  const loaded = 1 + output.output * seriesResistance;
  const emitter = (r2 * output.output) / loaded;
  const divisor = 1 + r2 * ((output.transconductance + output.output) / loaded + output.input);
  // Reference node: admittance of the reference transistor at the base line.
  const forward = reference.transconductance + reference.output;
  const admittance = (forward + reference.input / helperGain) / (1 + r1 * (forward + reference.input));
  const input = output.input / helperGain;
  const baseLine = (input * (emitter / divisor)) / (admittance + (outputs * input * (1 + emitter)) / divisor);
  const baseEmitter = ((1 + emitter) * baseLine - emitter) / divisor;
  const current = ((output.transconductance + output.output) * baseEmitter + output.output * (1 - baseLine)) / loaded;
  return 1 / current;
}

/** Wilson mirror; `inner` is the diode-connected transistor, `outer` the output one. */
export function wilsonResistance(
  reference: BipolarSlopes,
  inner: BipolarSlopes,
  outer: BipolarSlopes,
  seriesResistance: number,
): number {
  if (outer.output === 0) return Infinity;
  const loaded = 1 + outer.output * seriesResistance;
  // Reference node: gm1·b + go1·r + gπ3·(r − b) = 0, so r = b + excess·b.
  const excess = -(reference.transconductance + reference.output) / (outer.input + reference.output);
  const sunk = inner.transconductance + inner.output + inner.input + reference.input;
  // Base line: i3 + ib3 = sunk·b, with i3 = (gm3·excess·b + go3·(1 − b))/loaded.
  const baseLine =
    outer.output / loaded / (sunk - (outer.transconductance * excess - outer.output) / loaded - outer.input * excess);
  return loaded / (outer.transconductance * excess * baseLine + outer.output * (1 - baseLine));
}
