/** What a memoryless odd law makes of Gaussian noise. */
export interface NoiseResponse {
  /** g = E[x·f(x)]/E[x²]: the gain that leaves the least rest. */
  gain: number;
  /** Root of E[(f − g·x)²] over g·σ: what is not the signal scaled. */
  distortion: number;
}

/** Beyond this many standard deviations lies nothing that a double would notice. */
const reach = 9;
const leastPoints = 48;
const mostPoints = 1024;
const pointsPerSteepness = 40;

/**
 * Best-fit gain and distortion of an odd f for noise of standard deviation `sigma`, by the trapezoidal rule over half of
 * the real line; for an analytic f its error falls exponentially with the number of points.
 *
 * @param steepness sigma over the width of the curved part of f
 */
export function noiseResponse(f: (x: number) => number, sigma: number, steepness: number): NoiseResponse {
  const count = Math.round(Math.min(mostPoints, leastPoints + pointsPerSteepness * steepness));
  const points: { x: number; value: number; weight: number }[] = [];
  let [correlation, power] = [0, 0];
  for (let k = 1; k <= count; k++) {
    const z = (reach * k) / count;
    const weight = Math.exp((-z * z) / 2);
    const value = f(sigma * z);
    points.push({ x: z, value, weight });
    correlation += weight * z * value;
    power += weight * z * z;
  }
  const gain = correlation / power;
  const rest = points.reduce((sum, { x, value, weight }) => sum + weight * (value - gain * x) ** 2, 0);
  return { gain: gain / sigma, distortion: Math.sqrt(rest / power) / gain };
}
