/** Volts that a usual op-amp output stays away from its rail. From memory. */
export const headroomToRail = 1.5;

export interface Rails {
  railPositive: number;
  railNegative: number;
}

/** Swing of an op amp on these rails, V to either side. */
export const swingOn = ({ railPositive, railNegative }: Rails): number =>
  Math.max(0, Math.min(railPositive, -railNegative) - headroomToRail);
