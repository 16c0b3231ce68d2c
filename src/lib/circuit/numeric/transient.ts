/** An equation dy/dt = f(y) of one state, stiff or not. */
export interface Autonomous {
  slope(y: number): number;
  /** df/dy; need not be exact, but the closer the fewer the steps. */
  slopeDerivative(y: number): number;
}

export interface Transient {
  /** The state at a time of the stretch that was integrated; before it the first state, after it the last. */
  at(time: number): number;
  /** The last state. */
  end: number;
}

/** Substeps of the rows of the extrapolation table; its diagonal gains one order a row. */
const rows = [1, 2, 3, 4, 5, 6, 7] as const;
const mostSteps = 5000;

/**
 * Integrates a stiff equation of one state from time 0: the linearly implicit Euler rule, extrapolated to order seven
 * (Deuflhard's scheme; Hairer and Wanner, Solving Ordinary Differential Equations II, IV.9), with the step chosen so
 * that the last two columns of the table agree within the tolerance. It needs no inner iteration and follows a state
 * that settles far faster than the stretch is long.
 *
 * @param tolerance of each step, in the units of y; a thousandth of the error wanted is cheap
 * @throws RangeError where the steps become too many
 */
export function integrateStiff(equation: Autonomous, start: number, duration: number, tolerance: number): Transient {
  const times = [0];
  const states = [start];
  let [time, state] = [0, start];
  let step = duration / 16;
  for (let count = 0; time < duration; count++) {
    if (count >= mostSteps) throw new RangeError(`integrateStiff: more than ${mostSteps} steps over ${duration} s`);
    const last = time + step >= duration * (1 - 1e-14);
    const width = last ? duration - time : step;
    const { value, error } = extrapolated(equation, state, width);
    const accepted = error <= tolerance;
    // The error goes with the seventh power of the step; 0.9 keeps the next one from being refused by a hair.
    const growth = Math.min(4, Math.max(0.1, 0.9 * (tolerance / Math.max(error, tolerance * 1e-7)) ** (1 / 7)));
    step = Number.isFinite(error) ? width * growth : width / 10;
    if (!accepted) continue;
    time = last ? duration : time + width;
    state = value;
    times.push(time);
    states.push(state);
  }
  return {
    end: state,
    at(wanted) {
      if (wanted <= 0) return start;
      if (wanted >= duration) return state;
      let [low, high] = [0, times.length - 1];
      while (high - low > 1) {
        const middle = (low + high) >> 1;
        if (times[middle]! <= wanted) low = middle;
        else high = middle;
      }
      // Within one accepted step a shorter step is at least as exact.
      return extrapolated(equation, states[low]!, wanted - times[low]!).value;
    },
  };
}

/** One step by the extrapolation table, and how far its last two entries differ. */
function extrapolated(equation: Autonomous, start: number, width: number): { value: number; error: number } {
  const derivative = equation.slopeDerivative(start);
  const table: number[] = [];
  let error = Infinity;
  for (const [j, substeps] of rows.entries()) {
    const h = width / substeps;
    const divisor = 1 - h * derivative;
    let y = start;
    for (let k = 0; k < substeps; k++) y += (h * equation.slope(y)) / divisor;
    // Row j replaces row j − 1 in place, column by column.
    let entry = y;
    for (let k = 0; k < j; k++) {
      const above = table[k]!;
      table[k] = entry;
      error = Math.abs(entry - above) / (substeps / rows[j - 1 - k]! - 1);
      entry += (entry - above) / (substeps / rows[j - 1 - k]! - 1);
    }
    table[j] = entry;
  }
  return { value: table[rows.length - 1]!, error };
}
