/**
 * Real polynomials as coefficient arrays, constant term first: [c0, c1, c2] is c0 + c1 s + c2 s².
 * Transfer functions of the linear stages are built from these.
 */
export type Polynomial = readonly number[];

/** The product of polynomials. */
export function multiply(...factors: Polynomial[]): number[] {
  return factors.reduce<number[]>(
    (product, factor) => {
      const out = new Array<number>(product.length + factor.length - 1).fill(0);
      product.forEach((a, i) => factor.forEach((b, j) => (out[i + j]! += a * b)));
      return out;
    },
    [1],
  );
}

/** The sum of polynomials. */
export function add(...terms: Polynomial[]): number[] {
  const out = new Array<number>(Math.max(...terms.map((t) => t.length))).fill(0);
  for (const term of terms) term.forEach((c, i) => (out[i]! += c));
  return out;
}

/** The derivative. */
export function differentiate(p: Polynomial): number[] {
  return p.length <= 1 ? [0] : p.slice(1).map((c, i) => c * (i + 1));
}

/** Value at a real argument (Horner). */
export function evaluate(p: Polynomial, x: number): number {
  let value = 0;
  for (let i = p.length - 1; i >= 0; i--) value = value * x + p[i]!;
  return value;
}

/** Coefficients of |p(jω)|² as a polynomial in x = ω²: even part squared plus x times odd part squared. */
export function squaredMagnitude(p: Polynomial): number[] {
  const even = p.filter((_, i) => i % 2 === 0).map((c, k) => (k % 2 === 0 ? c : -c));
  const odd = p.filter((_, i) => i % 2 === 1).map((c, k) => (k % 2 === 0 ? c : -c));
  return add(multiply(even, even), odd.length ? multiply([0, 1], odd, odd) : [0]);
}

/** The polynomial of s/scale: q(u) = p(scale · u). Used to bring coefficients to comparable size before root finding. */
export function rescale(p: Polynomial, scale: number): number[] {
  return p.map((c, i) => c * scale ** i);
}

/** Drops leading (highest) coefficients that are exactly zero. */
export function trim(p: Polynomial): number[] {
  let end = p.length;
  while (end > 1 && p[end - 1] === 0) end--;
  return p.slice(0, end);
}
