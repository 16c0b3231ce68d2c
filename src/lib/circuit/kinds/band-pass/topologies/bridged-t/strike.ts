import { impulseResponse, stepResponse, type Mode } from "../../../../network/pulse.ts";
import { size } from "../../../../network/complex.ts";
import { solveBracketed } from "../../../../numeric/solveBracketed.ts";

/** A rectangular pulse at the input. */
export interface Strike {
  /** V. */
  height: number;
  /** s. */
  width: number;
}

/** Output voltage at a time after the pulse began, exact: one step less a later one. */
export function struckAt(modes: readonly Mode[], { height, width }: Strike, time: number): number {
  return height * (stepResponse(modes, time) - stepResponse(modes, time - width));
}

const slopeAt = (modes: readonly Mode[], { height, width }: Strike, time: number) =>
  height * (impulseResponse(modes, time) - impulseResponse(modes, time - width));

/** Points looked at in each stretch, many to a period, so that no turning point hides between two. */
const points = 48;
/** Periods after each edge within which the largest swing lies: both the pulse's flat and the ring only shrink. */
const periods = 1.5;

/**
 * The farthest that the output goes from rest, V: the turning points of the exact response, found as roots of its slope.
 *
 * @param period s, of the ring
 */
export function ringPeak(modes: readonly Mode[], strike: Strike, period: number): number {
  const stretches = [
    [0, Math.min(strike.width, periods * period)],
    [strike.width, strike.width + periods * period],
  ] as const;
  const slope = (time: number) => slopeAt(modes, strike, time);
  let peak = Math.abs(struckAt(modes, strike, strike.width));
  for (const [from, to] of stretches) {
    const step = (to - from) / points;
    // A hair inside, for the slope itself jumps at the edges of the pulse.
    let [left, before] = [from + step * 1e-9, slope(from + step * 1e-9)];
    for (let k = 1; k <= points; k++) {
      const right = from + step * (k === points ? points - 1e-9 : k);
      const after = slope(right);
      if (before * after < 0)
        peak = Math.max(peak, Math.abs(struckAt(modes, strike, solveBracketed(slope, left, right, 1e-12))));
      [left, before] = [right, after];
    }
  }
  return peak;
}

/** The amplitude that a short pulse leaves ringing: 2·|residue|·V·tp·sin(πf0tp)/(πf0tp). Loses its meaning at tp = 1/f0. */
export function ringEstimate(modes: readonly Mode[], { height, width }: Strike, centre: number): number | undefined {
  const mode = modes.find(({ pole }) => pole.im > 0);
  if (!mode) return undefined;
  const angle = Math.PI * centre * width;
  return 2 * size(mode.residue) * height * width * Math.abs(Math.sin(angle) / angle);
}
