/** A current that a stage takes from the rails. Both rails are counted positive; what leaves one alone goes to ground. */
export interface Draw {
  label: string;
  /** A, as the stage stands. */
  positive: number;
  negative: number;
  /** Flows at the peak of a hit alone, so that it counts towards the most and not towards the usual. */
  onlyInHits?: true;
  /** A current that dies away: what charges a capacitor. */
  pulse?: {
    /** A at its beginning. */
    current: number;
    /** s. */
    timeConstant: number;
    /** s that it may last; absent where it lasts until the capacitor is full. */
    width?: number;
    /** C that it carries in all. */
    charge: number;
  };
}
