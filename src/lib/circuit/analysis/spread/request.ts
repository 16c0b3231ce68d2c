import type { PlainConditions, PlainValues } from "../../stage/defaults.ts";

/** How a tolerance is read: every value within it equally likely, or as three standard deviations of a normal spread. */
export type Distribution = "uniform" | "three-sigma";

export interface Range {
  least: number;
  most: number;
}

/** What a result may be; a side left out is open. */
export type ResultWindows = Record<string, Partial<Range>>;

/** Boards to be drawn: how parts vary, and how many there are. */
export interface BoardsRequest {
  parts: PlainValues;
  conditions?: PlainConditions;
  /** Relative, to either side; a part that is left out is taken as exact. */
  tolerances: PlainValues;
  /** Relative change per kelvin from 25 °C, by part; matters only with `temperature`. */
  drifts?: Record<string, Range>;
  /** Boards are at any temperature of this range, K, with equal likelihood. Left out: all at the one of the conditions. */
  temperature?: Range;
  boards: number;
  /** A whole number of 32 bits. */
  seed: number;
  distribution: Distribution;
  /** Parts of one lot err together. */
  lots?: readonly (readonly string[])[];
}

export interface SpreadRequest extends BoardsRequest {
  window?: ResultWindows;
  /** The curve whose band is wanted, at these x or at a number over its usual stretch. */
  band?: { curve: string; at?: readonly number[] };
}

/** Part values are said for this temperature, K. */
export const referenceTemperature = 298.15;

export const mostBoards = 100_000;
