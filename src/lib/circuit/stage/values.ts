import type { ConditionField, PartField, ResultField, TargetField } from "./fields.ts";

export type Parts = Record<string, PartField>;
export type Conditions = Record<string, ConditionField>;
export type Targets = Record<string, TargetField>;
export type Results = Record<string, ResultField>;

/** Values by key, their types taken from the descriptors. */
export type PartValues<P extends Parts> = { readonly [K in keyof P]: number };
export type TargetValues<T extends Targets> = { readonly [K in keyof T]: number };
export type ConditionValues<C extends Conditions> = {
  readonly [K in keyof C]: C[K] extends { type: "choice"; options: infer O extends readonly { value: string }[] }
    ? O[number]["value"]
    : C[K] extends { default: number }
      ? number
      : number | null;
};
/** A result that has no meaning under the given values is left out, and a fault says why. */
export type ResultValues<R extends Results> = {
  readonly [K in keyof R]?: R[K] extends { list: true } ? readonly number[] : number;
};

/** Parts and conditions: all that decides what a stage does. */
export interface State<P extends Parts = Parts, C extends Conditions = Conditions> {
  parts: PartValues<P>;
  conditions: ConditionValues<C>;
}
