import type { Unit } from "../quantity/units.ts";
import type { Shown } from "./shown.ts";

export interface Axis {
  quantity: string;
  unit: Unit;
  scale: "linear" | "logarithmic";
  shown?: Shown;
}

/** One line of a curve: what follows the present state, or a companion such as "pot at 0°". */
export interface Line {
  /** "now" for the present state. */
  id: string;
  label: string;
  /** y at x, both in plain units. */
  at(x: number): number;
}

export interface Curve<S> {
  id: string;
  name: string;
  x: Axis;
  y: Axis;
  /** The stretch of x worth drawing. */
  domain(state: S): readonly [number, number];
  /** x values beyond which the curve has no meaning; not bounded where left out. */
  defined?: readonly [number, number];
  /** The present state first. */
  lines(state: S): readonly Line[];
  /** Where the eye should go: the operating point. */
  mark?(state: S): { x: number; label: string } | undefined;
  /** The target as a window on this plot. */
  window?(
    targets: Readonly<Record<string, { least: number; most: number }>>,
  ): { x?: readonly [number, number]; y?: readonly [number, number] } | undefined;
}

/** `count` values of x over a stretch, spaced as its axis is. */
export function spacedValues(axis: Axis, [from, to]: readonly [number, number], count: number): number[] {
  return Array.from({ length: count }, (_, i) => {
    const share = i / (count - 1);
    if (i === count - 1) return to;
    return axis.scale === "logarithmic" ? from * (to / from) ** share : from + (to - from) * share;
  });
}
