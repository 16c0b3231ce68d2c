import { electricalAngle } from "../../parts/electricalAngle.ts";

/** Far smaller than any law of a pot bends over, far larger than rounding. */
const smallTurn = 1e-4;

/**
 * What a retune pot does to the centre: the ends of its travel, their distance in semitones, and how fast the centre
 * moves at the present rotation.
 *
 * @param centreAt the exact centre in Hz at a rotation of 0 to 1; NaN where there is none
 * @returns only the figures that exist
 */
export function retuneFigures(centreAt: (rotation: number) => number, rotation: number) {
  const [retuneHigh, retuneLow] = [centreAt(0), centreAt(1)];
  const x = Math.min(Math.max(rotation, smallTurn), 1 - smallTurn);
  const cents = 1200 * Math.log2(centreAt(x + smallTurn) / centreAt(x - smallTurn));
  return existing({
    retuneLow,
    retuneHigh,
    retuneSpan: Math.abs(12 * Math.log2(retuneHigh / retuneLow)),
    retunePerDegree: cents / (2 * smallTurn * electricalAngle),
  });
}

/** Only the figures that are numbers. */
export function existing<K extends string>(figures: Partial<Record<K, number>>): Partial<Record<K, number>> {
  return Object.fromEntries(Object.entries(figures).filter(([, value]) => Number.isFinite(value))) as Partial<
    Record<K, number>
  >;
}
