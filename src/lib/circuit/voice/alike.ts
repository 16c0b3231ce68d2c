/** Relative; above what rounding leaves, below what any reader could see. */
const tolerance = 1e-12;

/** Whether two plain values say the same, figures to within rounding. */
export function alike(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true;
  if (typeof one === "number" && typeof other === "number") {
    return Math.abs(one - other) <= tolerance * Math.max(Math.abs(one), Math.abs(other));
  }
  if (typeof one !== "object" || typeof other !== "object" || one === null || other === null) return false;
  const [left, right] = [Object.entries(one), Object.entries(other)];
  if (left.length !== right.length) return false;
  return left.every(([key, value]) => key in other && alike(value, (other as Record<string, unknown>)[key]));
}
