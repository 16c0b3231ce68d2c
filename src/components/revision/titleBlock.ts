import type { RevisionSummary } from "#lib/wire/revision.ts";
import type { TitleBlockCell } from "../page/titleBlockCell.ts";
import { savedDay } from "../voice/savedTime.ts";

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

/** The title block of a revision: who prepared it, who checked it, and where it stands. */
export function revisionTitleBlock(
  voice: string,
  revision: Pick<RevisionSummary, "number" | "status" | "createdBy" | "createdAt" | "review">,
  sheet = "1 of 1",
): TitleBlockCell[] {
  const { decidedBy, decidedAt } = revision.review;
  return [
    { label: "Voice", value: voice, wide: true },
    { label: "Revision", value: String(revision.number) },
    { label: "Status", value: capital(revision.status) },
    { label: "Prepared by", value: revision.createdBy.name },
    { label: "Checked by", value: decidedBy?.name ?? "–" },
    { label: "Date", value: savedDay(decidedAt ?? revision.createdAt) },
    { label: "Sheet", value: sheet },
  ];
}
