import { designatorLetters, type AnyTopology, type PlainValues } from "#lib/circuit/index.ts";

/**
 * A reference designator for every fitted part: its own where it has one, else the next free number of its class letter.
 *
 * @param taken designators of the voice's other stages
 */
export function assignDesignators(
  topology: AnyTopology,
  parts: PlainValues,
  own: Record<string, string>,
  taken: Iterable<string>,
): Record<string, string> {
  const used = new Set([...taken, ...Object.values(own)]);
  return Object.fromEntries(
    Object.entries(topology.parts)
      .filter(([key]) => parts[key]! > 0)
      .map(([key, field]): [string, string] => {
        const designator = own[key] ?? nextFree(designatorLetters[field.partClass], used);
        used.add(designator);
        return [key, designator];
      }),
  );
}

function nextFree(letters: string, used: ReadonlySet<string>): string {
  let number = 1;
  while (used.has(`${letters}${number}`)) number += 1;
  return `${letters}${number}`;
}
