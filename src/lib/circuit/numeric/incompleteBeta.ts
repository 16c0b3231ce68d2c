/** Stirling's series is good to the last digit from here on; below, the argument is raised to it. */
const stirlingFrom = 12;

/** ln Γ(x) for x > 0, by Stirling's series (DLMF 5.11.1). */
function logGamma(x: number): number {
  let [shift, z] = [1, x];
  while (z < stirlingFrom) shift *= z++;
  const inverse = 1 / (z * z);
  const series = (1 / 12 - inverse * (1 / 360 - inverse * (1 / 1260 - inverse * (1 / 1680 - inverse / 1188)))) / z;
  return (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series - Math.log(shift);
}

/** The regularised incomplete beta function I_x(a, b), by its continued fraction (DLMF 8.17.22) after Lentz. */
export function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  // The fraction converges quickly only on this side; I_x(a, b) = 1 − I_(1−x)(b, a).
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x));
  let fraction = 1;
  let numerator = 1;
  let denominator = 1 / (1 - ((a + b) * x) / (a + 1));
  fraction = denominator;
  for (let m = 1; m < 10_000; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    denominator = 1 / (1 + even * denominator);
    numerator = 1 + even / numerator;
    fraction *= denominator * numerator;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    denominator = 1 / (1 + odd * denominator);
    numerator = 1 + odd / numerator;
    const step = denominator * numerator;
    fraction *= step;
    if (Math.abs(step - 1) < 1e-15) break;
  }
  return (front * fraction) / a;
}
