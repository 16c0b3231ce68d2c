import { designatorLetters, type PartClass } from "#lib/circuit/index.ts";

/** R for resistors, C for capacitors, RV for pots, and a number without leading zeros (IEEE 315 class letters). */
export function designatorFault(partClass: PartClass, text: string): string | undefined {
  const letters = designatorLetters[partClass];
  if (new RegExp(`^${letters}[1-9]\\d{0,4}$`).test(text)) return undefined;
  return `Write ${letters} and a number, such as ${letters}12.`;
}
