import { deviceClasses } from "../device/classes.ts";
import { designatorLetters } from "../stage/fields.ts";
import type { ChainStage, FindTopology } from "./chain.ts";

/** A place on the board that a designator names. */
interface Place {
  stage: ChainStage;
  key: string;
  letters: string;
  /** Devices of its class in a package; packages are filled one after the other. */
  perPackage: number;
  /** Devices share a package only with those of their class. */
  sort: string;
}

function placesOf(stage: ChainStage, find: FindTopology): Place[] {
  const topology = find(stage.kind, stage.topology)?.topology;
  if (!topology) return [];
  const parts = Object.entries(topology.parts)
    .filter(([key]) => (stage.parts[key] ?? 0) > 0)
    .map(([key, { partClass }]) => ({ key, letters: designatorLetters[partClass], perPackage: 1, sort: partClass }));
  const devices = topology.devices.map(({ key, letter, deviceClass }) => ({
    ...{ key, letters: letter, perPackage: deviceClasses[deviceClass].perPackage, sort: deviceClass },
  }));
  return [...parts, ...devices].map((place) => ({ stage, ...place }));
}

/**
 * Gives every part and device of a voice that has no designator the next one free of its class, in the order of the
 * stages. With `renumber`, all begin again at one.
 */
export function designate(stages: readonly ChainStage[], find: FindTopology, { renumber = false } = {}): ChainStage[] {
  const places = stages.flatMap((stage) => placesOf(stage, find));
  const known = new Set(places.map(({ stage, key }) => JSON.stringify([stage.id, key])));
  // What no place is known for is kept: a stage of another version, a part that is not fitted for now.
  const kept = stages.map(({ id, designators }) =>
    Object.entries(designators).filter(([key]) => !renumber || !known.has(JSON.stringify([id, key]))),
  );
  const giver = new Giver(kept.flat().map(([, designator]) => designator));
  if (!renumber)
    for (const { stage, key, sort, perPackage } of places) giver.note(stage.designators[key], sort, perPackage);
  const given = new Map<string, Record<string, string>>();
  for (const place of places) {
    const { stage, key } = place;
    if (!renumber && stage.designators[key] !== undefined) continue;
    given.set(stage.id, { ...given.get(stage.id), [key]: giver.next(place) });
  }
  return stages.map((stage, index) => {
    const own = given.get(stage.id);
    if (!own && !renumber) return stage;
    return { ...stage, designators: { ...Object.fromEntries(kept[index]!), ...own } };
  });
}

const unitLetters = "ABCDEFGH";

class Giver {
  private readonly taken: Set<string>;
  private readonly numbers = new Set<string>();
  /** Units that are free in packages begun, by class of device. */
  private readonly open = new Map<string, string[]>();

  constructor(taken: readonly string[]) {
    this.taken = new Set(taken);
    for (const designator of taken) this.numbers.add(packageOf(designator));
  }

  /** Counts a package that is there already as begun. */
  note(designator: string | undefined, sort: string, perPackage: number): void {
    if (designator === undefined || perPackage === 1 || !/[A-H]$/.test(designator)) return;
    const units = unitsOf(packageOf(designator), perPackage).filter((unit) => !this.taken.has(unit));
    this.open.set(sort, [...new Set([...(this.open.get(sort) ?? []), ...units])]);
  }

  next({ letters, perPackage, sort }: Place): string {
    const begun = this.open.get(sort) ?? [];
    const unit = begun.shift();
    if (unit !== undefined) {
      this.taken.add(unit);
      return unit;
    }
    let number = 1;
    while (this.numbers.has(`${letters}${number}`)) number += 1;
    const designator = `${letters}${number}`;
    this.numbers.add(designator);
    if (perPackage === 1) return designator;
    const [first, ...others] = unitsOf(designator, perPackage);
    this.open.set(sort, others);
    return first!;
  }
}

const packageOf = (designator: string) => designator.replace(/(?<=\d)[A-H]$/, "");
const unitsOf = (designator: string, count: number) =>
  [...unitLetters.slice(0, count)].map((unit) => designator + unit);

export interface DesignatorFaults {
  /** Designators that stand more than once, and where. */
  duplicates: { designator: string; places: { stage: string; part: string }[] }[];
  /** Numbers that are left out between the first and the last of a class. */
  gaps: string[];
  /** Places without one. */
  missing: { stage: string; part: string }[];
}

/** What is wrong with the designators of a voice. */
export function designatorFaults(stages: readonly ChainStage[], find: FindTopology): DesignatorFaults {
  const holders = new Map<string, { stage: string; part: string }[]>();
  for (const { id, designators } of stages) {
    for (const [part, designator] of Object.entries(designators)) {
      holders.set(designator, [...(holders.get(designator) ?? []), { stage: id, part }]);
    }
  }
  const numbers = new Map<string, Set<number>>();
  for (const designator of holders.keys()) {
    const match = /^([A-Z]+)(\d+)/.exec(designator);
    if (match) numbers.set(match[1]!, (numbers.get(match[1]!) ?? new Set()).add(Number(match[2])));
  }
  return {
    duplicates: [...holders].flatMap(([designator, places]) => (places.length > 1 ? [{ designator, places }] : [])),
    gaps: [...numbers].sort(([a], [b]) => (a < b ? -1 : 1)).flatMap(([letters, taken]) => gapsOf(letters, taken)),
    missing: stages.flatMap((stage) =>
      placesOf(stage, find)
        .filter(({ key }) => stage.designators[key] === undefined)
        .map(({ key }) => ({ stage: stage.id, part: key })),
    ),
  };
}

/** A run of more is one entry: R4–R9. */
function gapsOf(letters: string, taken: ReadonlySet<number>): string[] {
  const sorted = [...taken].sort((a, b) => a - b);
  return sorted.flatMap((number, index) => {
    const before = sorted[index - 1] ?? 0;
    if (number - before <= 1) return [];
    const [first, last] = [before + 1, number - 1];
    return [first === last ? `${letters}${first}` : `${letters}${first}–${letters}${last}`];
  });
}
