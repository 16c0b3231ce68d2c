/** Where a revision stands, in the words of the title block. */
export const revisionStatuses = ["in preparation", "under review", "returned", "released", "superseded"] as const;

export type RevisionStatus = (typeof revisionStatuses)[number];

/** What may follow what. The database holds the same table in a trigger, so that no slip in the code can bend it. */
export const statusTransitions: Readonly<Record<RevisionStatus, readonly RevisionStatus[]>> = {
  "in preparation": ["under review", "superseded"],
  "under review": ["released", "returned", "superseded"],
  // What was sent back is answered by a new revision, so that both can be compared.
  returned: [],
  released: ["superseded"],
  superseded: [],
};

export const mayFollow = (from: RevisionStatus, to: RevisionStatus): boolean => statusTransitions[from].includes(to);
