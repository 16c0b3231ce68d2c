import type { Point } from "#lib/circuit/index.ts";

/** Pixels of a grid step. */
export const step = 20;

export const px = (n: number) => n * step;

export const pointsOf = (points: readonly Point[]) => points.map(([x, y]) => `${px(x)},${px(y)}`).join(" ");

/** Where a two-ended symbol lies: its start, length and angle, and its middle for the words beside it. */
export function placeOf(from: Point, to: Point) {
  const [x1, y1] = [px(from[0]), px(from[1])];
  const [x2, y2] = [px(to[0]), px(to[1])];
  return {
    transform: `translate(${x1} ${y1}) rotate(${(Math.atan2(y2 - y1, x2 - x1) * 180) / Math.PI})`,
    length: Math.hypot(x2 - x1, y2 - y1),
    upright: Math.abs(x2 - x1) < Math.abs(y2 - y1),
    middle: [(x1 + x2) / 2, (y1 + y2) / 2] as const,
  };
}
