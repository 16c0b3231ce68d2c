import type { workingCopies } from "#lib/db/index.ts";
import type { WorkingCopyAnswer, WorkingCopyDocument } from "#lib/wire/workingCopy.ts";
import { etagOf } from "./etag.ts";

export type WorkingCopyRow = typeof workingCopies.$inferSelect;

export interface PresentedCopy {
  etag: string;
  copy: WorkingCopyAnswer;
}

export function presentWorkingCopy(row: WorkingCopyRow): PresentedCopy {
  // Only what passed the schema is ever stored.
  const { format, stages, links, conditions, accepted } = row.document as WorkingCopyDocument;
  return {
    etag: etagOf(row.version),
    copy: {
      id: row.voiceId,
      createdAt: row.createdAt.toISOString(),
      updatedAt: row.updatedAt.toISOString(),
      format,
      stages,
      links,
      conditions,
      ...(accepted && { accepted }),
    },
  };
}
