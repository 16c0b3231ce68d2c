/**
 * Real polynomials as coefficient arrays, constant term first: [c0, c1, c2] is c0 + c1 s + c2 s².
 * Transfer functions of the linear stages are built from these. Plain loops that fill each array once: every analysis
 * passes here dozens of times, and what it throws away costs a server more than what it computes.
 */
export type Polynomial = readonly number[];

/** The product of polynomials. */
export function multiply(...factors: Polynomial[]): number[] {
  let product = [1];
  for (const factor of factors) product = productOf(product, factor);
  return product;
}

function productOf(p: Polynomial, q: Polynomial): number[] {
  if (p.length === 1 && p[0] === 1) return q.slice();
  const out: number[] = [];
  for (let k = 0; k < p.length + q.length - 1; k++) {
    let sum = 0;
    for (let i = Math.max(0, k - q.length + 1); i <= k && i < p.length; i++) sum += p[i]! * q[k - i]!;
    out.push(sum);
  }
  return out;
}

/** The sum of polynomials. */
export function add(...terms: Polynomial[]): number[] {
  let length = 0;
  for (const term of terms) length = Math.max(length, term.length);
  const out: number[] = [];
  for (let k = 0; k < length; k++) {
    let sum = 0;
    for (const term of terms) if (k < term.length) sum += term[k]!;
    out.push(sum);
  }
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

/** Coefficients of |p(jω)|² = p(jω)·p(−jω) as a polynomial in x = ω²: that of xᵏ is Σᵢ (−1)^(i−k)·cᵢ·c₂ₖ₋ᵢ. */
export function squaredMagnitude(p: Polynomial): number[] {
  const out: number[] = [];
  for (let k = 0; k < p.length; k++) {
    let sum = 0;
    for (let i = Math.max(0, 2 * k - p.length + 1); i <= 2 * k && i < p.length; i++) {
      const product = p[i]! * p[2 * k - i]!;
      sum += (i - k) % 2 === 0 ? product : -product;
    }
    out.push(sum);
  }
  return out;
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
