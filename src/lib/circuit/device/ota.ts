import { solveIncreasing } from "../numeric/solveIncreasing.ts";

/**
 * A bipolar transconductance amplifier: a differential pair whose tail current is the bias current, Iout = Iabc·t with
 * t = tanh(V/(2·VT)) at the pair's inputs. Linearising diodes, fed with ID through the same source resistance at both
 * inputs, predistort what reaches the pair: u = 2·VT·artanh(t) + R·ID·t.
 */
export interface PairInput {
  /** kT/e, V. */
  thermal: number;
  /** R·ID: the diode current through the source resistance of one input, V; 0 with the diodes unused. */
  diodeDrop: number;
}

/** Share t of the bias current, −1 to 1, at a source voltage u in volts. Exact: the predistorted law by Newton. */
export function currentShare({ thermal, diodeDrop }: PairInput, voltage: number): number {
  const scaled = Math.abs(voltage) / (2 * thermal);
  if (diodeDrop === 0) return Math.tanh(voltage / (2 * thermal));
  const linearity = diodeDrop / (2 * thermal);
  // y + D·tanh(y) = u/(2·VT); between the slopes of small and of large signals.
  const [least, most] = [Math.max(scaled / (1 + linearity), scaled - linearity), scaled];
  const y = solveIncreasing(
    (at) => {
      const tanh = Math.tanh(at);
      return [at + linearity * tanh - scaled, 1 + linearity * (1 - tanh * tanh)];
    },
    least,
    least,
    most,
  );
  return Math.sign(voltage) * Math.tanh(y);
}

/** Slope dIout/du of small signals, S: Iabc/(2·VT + R·ID). */
export function smallSignalTransconductance({ thermal, diodeDrop }: PairInput, biasCurrent: number): number {
  return biasCurrent / (2 * thermal + diodeDrop);
}
