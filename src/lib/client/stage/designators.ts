import { designatorLetters, type AnyTopology, type PlainValues } from "#lib/circuit/index.ts";

/**
 * A reference designator for every fitted part: its own where it has one, else the next free number of its class letter.
 * Devices keep those they have.
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
  const marks: Record<string, string> = {};
  for (const [key, field] of Object.entries(topology.parts)) {
    if (!(parts[key]! > 0)) continue;
    marks[key] = own[key] ?? nextFree(designatorLetters[field.partClass], used);
    used.add(marks[key]);
  }
  for (const { key } of topology.devices) if (own[key] !== undefined) marks[key] = own[key];
  return marks;
}

function nextFree(letters: string, used: ReadonlySet<string>): string {
  let number = 1;
  while (used.has(`${letters}${number}`)) number += 1;
  return `${letters}${number}`;
}
