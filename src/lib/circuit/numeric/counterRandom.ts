/**
 * Random numbers by counter instead of by sequence: draw number (board, stream) of a seed is the same whoever asks for
 * it, in whatever order and on whatever machine, since only integer arithmetic is involved.
 *
 * The generator is Philox2x32-10 (Salmon, Moraes, Dror and Shaw, "Parallel random numbers: as easy as 1, 2, 3", SC11,
 * 2011): ten rounds of a 32 × 32 bit multiplication on the counter, keyed by the seed.
 */
const multiplier = 0xd256d193;
const [multiplierHigh, multiplierLow] = [multiplier >>> 16, multiplier & 0xffff];
const keyStep = 0x9e3779b9;
const rounds = 10;

/** Seeds are whole numbers of 32 bits. */
export const mostSeed = 0xffffffff;

/**
 * A number of the open interval 0 to 1, on the grid (k + ½)/2⁵²; never 0 or 1, so that it may be put through any inverse
 * distribution.
 *
 * @param seed 0 to 2³² − 1
 * @param counter which draw, 0 to 2³² − 1
 * @param stream which of the quantities drawn each time, 0 to 2³² − 1
 */
export function uniformAt(seed: number, counter: number, stream: number): number {
  let left = counter | 0;
  let right = stream | 0;
  let key = seed | 0;
  for (let round = 0; round < rounds; round++) {
    const low = Math.imul(multiplier, left);
    const high = highProduct(left);
    left = high ^ key ^ right;
    right = low;
    key = (key + keyStep) | 0;
  }
  return ((left >>> 6) * 67108864 + (right >>> 6) + 0.5) / 4503599627370496;
}

/** The upper 32 bits of multiplier × value, from products of halves that never pass 32 bits. */
function highProduct(value: number): number {
  const high = value >>> 16;
  const low = value & 0xffff;
  const cross = (Math.imul(multiplierHigh, low) + (Math.imul(multiplierLow, low) >>> 16)) >>> 0;
  const middle = (Math.imul(multiplierLow, high) + (cross & 0xffff)) >>> 0;
  return (Math.imul(multiplierHigh, high) + (cross >>> 16) + (middle >>> 16)) | 0;
}
