import type { StoredLink, StoredStage, WorkingCopyDocument } from "../workingCopy.ts";

/** A place that both sides changed, each in its own way. */
export interface Clash {
  /** Id of the stage; empty for the conditions of the whole voice. */
  id: string;
  name: string;
  /** Whether a side removed it. */
  mine: "changed" | "removed";
  theirs: "changed" | "removed";
}

export type Choice = "mine" | "theirs";

export interface Merged {
  document: WorkingCopyDocument;
  /** Without a choice for one of these, the document holds what is mine. */
  clashes: Clash[];
}

const same = (one: unknown, other: unknown) => JSON.stringify(one) === JSON.stringify(other);

/**
 * Brings two changes of one document together, stage by stage: what one side alone changed is taken, and what both did is
 * for a person to choose.
 */
export function mergeDocuments(
  base: WorkingCopyDocument,
  mine: WorkingCopyDocument,
  theirs: WorkingCopyDocument,
  choices: Readonly<Record<string, Choice>> = {},
): Merged {
  const clashes: Clash[] = [];
  const pick = <T>(before: T | undefined, my: T | undefined, their: T | undefined, id: string, name: string) => {
    if (same(my, before)) return their;
    if (same(their, before) || same(my, their)) return my;
    const word = (side: T | undefined) => (side === undefined ? "removed" : "changed");
    clashes.push({ id, name, mine: word(my), theirs: word(their) });
    return choices[id] === "theirs" ? their : my;
  };
  const stages = orderOf(base, mine, theirs).flatMap((id) => {
    const [before, my, their] = [base, mine, theirs].map((one) => one.stages.find((stage) => stage.id === id));
    return pick<StoredStage>(before, my, their, id, (my ?? their ?? before)!.name) ?? [];
  });
  const known = new Set(stages.map(({ id }) => id));
  const links = idsOf(theirs.links, mine.links).flatMap((id): StoredLink[] => {
    const [before, my, their] = [base, mine, theirs].map((one) => one.links.find((link) => link.id === id));
    const kept = same(my, before) ? their : my;
    return kept && known.has(kept.from.stage) && known.has(kept.to.stage) ? [kept] : [];
  });
  const conditions = pick(base.conditions, mine.conditions, theirs.conditions, "", "Conditions of the voice") ?? {};
  const accepted = same(mine.accepted, base.accepted) ? theirs.accepted : mine.accepted;
  return { document: { format: 1, stages, links: fedOnce(links), conditions, ...(accepted && { accepted }) }, clashes };
}

const idsOf = (...lists: readonly (readonly { id: string }[])[]) => [...new Set(lists.flat().map(({ id }) => id))];

/** Their order, unless mine alone moved anything. */
function orderOf(base: WorkingCopyDocument, mine: WorkingCopyDocument, theirs: WorkingCopyDocument): string[] {
  const order = ({ stages }: WorkingCopyDocument) => stages.map(({ id }) => id);
  return same(order(theirs), order(base)) ? idsOf(mine.stages, theirs.stages) : idsOf(theirs.stages, mine.stages);
}

/** Two people may have fed one input; the later link gives way. */
function fedOnce(links: readonly StoredLink[]): StoredLink[] {
  const fed = new Set<string>();
  return links.filter(({ to }) => {
    const input = JSON.stringify([to.stage, to.port]);
    if (fed.has(input)) return false;
    fed.add(input);
    return true;
  });
}
