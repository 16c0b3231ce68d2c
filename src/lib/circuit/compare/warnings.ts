import type { StageWarning } from "../voice/analyseStages.ts";

export interface WarningChanges {
  gone: StageWarning[];
  new: StageWarning[];
}

const kindOf = ({ stage, code }: StageWarning) => `${stage} ${code}`;

/**
 * Warnings that came and went. A warning is the same one as long as its stage and code are, whatever its figure; where a
 * code stands several times in a stage, those of one limit belong together.
 */
export function changedWarnings(from: readonly StageWarning[], to: readonly StageWarning[]): WarningChanges {
  const open = new Map<string, StageWarning[]>();
  for (const warning of from) open.set(kindOf(warning), [...(open.get(kindOf(warning)) ?? []), warning]);
  const unmatched: StageWarning[] = [];
  const take = (warning: StageWarning, fits: (candidate: StageWarning) => boolean) => {
    const candidates = open.get(kindOf(warning)) ?? [];
    const index = candidates.findIndex(fits);
    if (index === -1) return false;
    candidates.splice(index, 1);
    return true;
  };
  for (const warning of to) if (!take(warning, ({ limit }) => limit === warning.limit)) unmatched.push(warning);
  return { new: unmatched.filter((warning) => !take(warning, () => true)), gone: [...open.values()].flat() };
}
