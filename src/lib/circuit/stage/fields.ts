import type { Unit } from "../quantity/units.ts";
import type { Shown } from "./shown.ts";

/**
 * Descriptors of what a stage takes and gives. Forms, request schemas, saved documents, plots, parts lists and the
 * published description are all derived from these; nothing about a field is said a second time anywhere else.
 */
interface Named {
  /** What the field is, in sentence case: "Centre frequency". */
  label: string;
  /** The symbol of the formulas, as plain text with subscripts after an underscore: "f_0". */
  symbol: string;
  /** One sentence for the person filling it in. */
  help?: string;
}

/** A number to be given. The sane range is what the trade uses; values up to 1000 times beyond it are still computed. */
export interface NumberField extends Named {
  type: "number";
  unit: Unit;
  /** `null`: absent unless given (an ideal op amp has no gain-bandwidth). */
  default: number | null;
  least: number;
  most: number;
  scale: "linear" | "logarithmic";
  /** The bounds beyond which the figure is refused; derived from the sane range where not said. */
  accepts?: readonly [least: number, most: number];
  /** What to offer when an absent field is switched on. */
  suggestion?: number;
}

export type PartClass = "resistor" | "capacitor" | "pot";

export interface PartField extends NumberField {
  default: number;
  partClass: PartClass;
  /** Relative tolerance that such a part usually has. */
  tolerance: number;
  /** Of a pot: the fixed parts in series with it, which bound its travel. */
  padding?: readonly string[];
}

/** What is wanted of a result. */
export interface TargetField extends NumberField {
  default: number;
  /** The result of the same meaning. */
  result: string;
  /** Relative half-width of the window around the target. */
  window: number;
}

export interface ChoiceField extends Named {
  type: "choice";
  default: string;
  options: readonly { value: string; label: string }[];
}

/** A condition that only means something while a part is fitted names that part. */
interface OfPart {
  ofPart?: string;
}

export type ConditionField = (NumberField | ChoiceField) & OfPart;

export interface ResultField {
  label: string;
  symbol: string;
  unit: Unit;
  /** Id of the formula that gives it. */
  formula: string;
  help?: string;
  /** How it is shown where that is not the plain unit: a share as per cent. */
  shown?: Shown;
  /** A yes-or-no result, 1 or 0, shown with these words. */
  words?: { yes: string; no: string };
  /** Several figures of one kind (hit times, gains) instead of one. */
  list?: true;
}

/** The reference-designator class letter of a part class (IEEE 315). */
export const designatorLetters: Record<PartClass, string> = { resistor: "R", capacitor: "C", pot: "RV" };

/** Least and most that is computed at all. */
export function acceptedRange(field: NumberField): readonly [number, number] {
  if (field.accepts) return field.accepts;
  if (field.scale === "logarithmic") return [field.least > 0 ? field.least / 1000 : 0, field.most * 1000];
  const slack = 10 * Math.max(Math.abs(field.least), Math.abs(field.most));
  return [field.least >= 0 ? 0 : -slack, slack];
}

type Defaults = { type: "number"; scale: "logarithmic" };
const logarithmic: Defaults = { type: "number", scale: "logarithmic" };

type PartInput = Named & { default: number; least?: number; most?: number; tolerance?: number; suggestion?: number };
type PotInput = PartInput & Pick<PartField, "padding">;

/** A fixed resistor; sane range 10 Ω to 10 MΩ unless said. Tolerance 1 % film. */
export const resistor = (field: PartInput): PartField => ({
  ...logarithmic,
  unit: "Ω",
  least: 10,
  most: 10e6,
  tolerance: 0.01,
  ...field,
  partClass: "resistor",
});

/** A capacitor; sane range 10 pF to 1000 µF unless said. Tolerance 5 %. */
export const capacitor = (field: PartInput): PartField => ({
  ...logarithmic,
  unit: "F",
  least: 10e-12,
  most: 1e-3,
  tolerance: 0.05,
  ...field,
  partClass: "capacitor",
});

/** A pot; zero means "not fitted" where the range allows it. Tolerance 20 % carbon. */
export const pot = (field: PotInput): PartField => ({
  ...logarithmic,
  unit: "Ω",
  least: 0,
  most: 10e6,
  tolerance: 0.2,
  ...field,
  partClass: "pot",
});

/** A wanted figure. */
export const target = (field: Omit<TargetField, "type" | "scale">): TargetField => ({ ...logarithmic, ...field });

type ConditionInput = Omit<NumberField, "type" | "scale"> & { scale?: NumberField["scale"] } & OfPart;

/** A figure of the stage's surroundings, spaced logarithmically unless said. Whether it may be absent stays in its type. */
export const condition = <const F extends ConditionInput>(field: F): F & NumberField => ({ ...logarithmic, ...field });

/** A choice among named options, whose values stay in its type. */
export const choice = <const F extends Omit<ChoiceField, "type"> & OfPart>(field: F): F & ChoiceField => ({
  ...field,
  type: "choice",
});
