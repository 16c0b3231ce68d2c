import { designatorLetters, type PartClass } from "../stage/fields.ts";

/** The lowest number of a class that is not yet given away in the voice; marks it as given. */
export function nextDesignator(partClass: PartClass, taken: Set<string>): string {
  const letters = designatorLetters[partClass];
  let number = 1;
  while (taken.has(`${letters}${number}`)) number += 1;
  const designator = `${letters}${number}`;
  taken.add(designator);
  return designator;
}
