import type { shareLinks } from "#lib/db/index.ts";
import type { ShareLinkAnswer } from "#lib/wire/shareLink.ts";

interface Row {
  link: typeof shareLinks.$inferSelect;
  number: number;
  creator: string | null;
}

export function presentShareLink({ link, number, creator }: Row): ShareLinkAnswer {
  return {
    id: link.id,
    revision: number,
    createdAt: link.createdAt.toISOString(),
    updatedAt: link.updatedAt.toISOString(),
    createdBy: creator === null ? null : { id: link.createdById, name: creator },
    expiresAt: link.expiresAt?.toISOString() ?? null,
    openings: link.openings,
    lastOpenedAt: link.lastOpenedAt?.toISOString() ?? null,
  };
}
