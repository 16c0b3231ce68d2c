import { formatQuantity, printQuantity, type Printed } from "../quantity/format.ts";
import type { Unit } from "../quantity/units.ts";

/** How a person reads a figure where that is not its plain unit: a share as per cent, a rotation of 0 to 1 as degrees. */
export interface Shown {
  unit: Unit;
  factor: number;
}

export const perCent: Shown = { unit: "%", factor: 100 };
/** Of a relative change per kelvin. */
export const perMillion: Shown = { unit: "ppm/K", factor: 1e6 };

interface Measured {
  unit: Unit;
  shown?: Shown;
}

/** A figure in the plain unit, printed as a person reads it. */
export const printShown = (value: number, { unit, shown }: Measured): Printed =>
  printQuantity(value * (shown?.factor ?? 1), shown?.unit ?? unit);

/** {@link printShown} as one string. */
export const formatShown = (value: number, { unit, shown }: Measured): string =>
  formatQuantity(value * (shown?.factor ?? 1), shown?.unit ?? unit);
