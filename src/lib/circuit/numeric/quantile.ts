/**
 * The value below which a share of the sample lies, interpolated between order statistics at (n − 1)·share: type 7 of
 * Hyndman and Fan, The American Statistician 50 (1996) 361–365, which numpy and most others take.
 *
 * @param ascending sorted, at least one value
 */
export function quantile(ascending: ArrayLike<number>, share: number): number {
  const place = (ascending.length - 1) * share;
  const below = Math.floor(place);
  const low = ascending[below]!;
  const high = ascending[Math.min(below + 1, ascending.length - 1)]!;
  return low + (high - low) * (place - below);
}
