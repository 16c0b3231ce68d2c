import type { AnyTopology, PlainValues } from "#lib/circuit/index.ts";
import { designatorFault } from "#lib/wire/designator.ts";
import type { StoredStage } from "../workingCopy.ts";
import { assignDesignators } from "./designators.ts";

export interface Marks {
  /** What stands in each fitted part's field, good or not. */
  typed: Record<string, string>;
  /** What each fitted part is called meanwhile. */
  designators: Record<string, string>;
  /** By part. */
  faults: Record<string, string>;
}

interface Marked {
  topology: AnyTopology;
  parts: PlainValues;
  saved: Record<string, string>;
  /** Only what was changed by hand. */
  typed: Record<string, string>;
  others: readonly StoredStage[];
}

/** People write r12; a drawing says R12. */
export const readDesignator = (text: string) => text.trim().toUpperCase();

/**
 * The designators of a stage while they are typed over. All fields are judged together, so that two parts can swap theirs
 * one field after the other.
 */
export function marksOf({ topology, parts, saved, typed, others }: Marked): Marks {
  const holders = new Map(
    others.flatMap(({ name, designators }) => Object.values(designators).map((mark): [string, string] => [mark, name])),
  );
  const read = Object.fromEntries(Object.entries(typed).map(([part, text]) => [part, readDesignator(text)]));
  const wanted = assignDesignators(topology, parts, { ...saved, ...read }, holders.keys());

  const faults: Record<string, string> = {};
  for (const [part, mark] of Object.entries(wanted)) {
    if (!(part in topology.parts)) continue;
    const twin = Object.keys(wanted).find((other) => other !== part && wanted[other] === mark);
    const malformed = designatorFault(topology, part, mark);
    if (malformed !== undefined) faults[part] = malformed;
    else if (holders.has(mark)) faults[part] = `${mark} is taken in ${holders.get(mark)}. Choose another number.`;
    else if (twin !== undefined && part in typed) {
      faults[part] =
        `${mark} is also the ${topology.parts[twin]!.label} of this stage. Give one of them another number.`;
    }
  }

  const good = Object.fromEntries(Object.entries(read).filter(([part]) => faults[part] === undefined));
  return {
    typed: { ...wanted, ...Object.fromEntries(Object.entries(typed).filter(([part]) => part in wanted)) },
    designators: assignDesignators(topology, parts, { ...saved, ...good }, holders.keys()),
    faults,
  };
}
