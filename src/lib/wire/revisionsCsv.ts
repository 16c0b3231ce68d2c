import { csvText } from "./csvText.ts";
import type { RevisionSummary } from "./revision.ts";

export function revisionsCsv(revisions: readonly RevisionSummary[]): string {
  return csvText([
    ["Revision", "Status", "Reason", "Prepared by", "Prepared (UTC)", "Checked by", "Decided (UTC)", "Note", "Library"],
    ...revisions.map(({ number, status, reason, createdBy, createdAt, review, libraryVersion }) => [
      ...[number, status, reason, createdBy.name, createdAt],
      ...[review.decidedBy?.name ?? "", review.decidedAt ?? "", review.note ?? "", libraryVersion],
    ]),
  ]);
}
