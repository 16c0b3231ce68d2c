import type { PartClass } from "../stage/fields.ts";

/**
 * Tolerances that each class is sold in, and what one costs against the usual: points that only rank one change against
 * another. Common practice, no source; prices of the day decide.
 */
export const toleranceSteps: Record<PartClass, readonly { tolerance: number; cost: number }[]> = {
  resistor: [
    { tolerance: 0.05, cost: 0 },
    { tolerance: 0.01, cost: 1 },
    { tolerance: 0.005, cost: 3 },
    { tolerance: 0.001, cost: 8 },
  ],
  capacitor: [
    { tolerance: 0.2, cost: 0 },
    { tolerance: 0.1, cost: 1 },
    { tolerance: 0.05, cost: 3 },
    { tolerance: 0.02, cost: 8 },
    { tolerance: 0.01, cost: 16 },
  ],
  pot: [
    { tolerance: 0.2, cost: 0 },
    { tolerance: 0.1, cost: 10 },
    { tolerance: 0.05, cost: 25 },
  ],
};

/** What a tolerance costs: that of the coarsest step which is as good. */
export const toleranceCost = (partClass: PartClass, tolerance: number): number =>
  toleranceSteps[partClass].find((step) => step.tolerance <= tolerance * (1 + 1e-9))?.cost ??
  toleranceSteps[partClass].at(-1)!.cost;
