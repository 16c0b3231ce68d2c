import { newId, shareLinks } from "#lib/db/index.ts";
import type { newShareLink, newShareLinkAnswer } from "#lib/wire/shareLink.ts";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { findRevision } from "../revisions/load.ts";
import { hashOfSecret, newSecret } from "../secretToken.ts";
import { lockVoice } from "../voices/load.ts";
import { presentShareLink } from "./present.ts";

interface Make {
  ctx: Context;
  input: z.output<typeof newShareLink> & { id: string };
}

/** An address that opens one released revision without an account. The address leaves here and is kept nowhere. */
export async function makeShareLink({ ctx, input }: Make): Promise<z.output<typeof newShareLinkAnswer>> {
  const { id: voiceId, revision: number } = input;
  const { userId, name } = memberOf(ctx);
  const at = ctx.now();
  const expiresAt = input.expiresAt === undefined ? null : new Date(input.expiresAt);
  const token = newSecret();
  return ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, voiceId, "shareLink.make");
    const revision = await findRevision(tx, voiceId, number);
    if (revision.status !== "released") {
      throw new Refusal(
        "conflict",
        `Revision ${number} is ${revision.status}. Only what is released is shown to guests. Nothing was changed.`,
      );
    }
    if (expiresAt !== null && expiresAt <= at) {
      throw new Refusal("invalid-input", "This link would be over before it began.", {
        errors: [{ path: "expiresAt", message: "Give a moment that is still to come." }],
      });
    }
    const id = newId("lnk");
    const [row] = await tx
      .insert(shareLinks)
      .values({
        ...{ id, voiceId, revisionId: revision.id, tokenHash: hashOfSecret(token), createdById: userId, expiresAt },
        ...{ createdAt: at, updatedAt: at },
      })
      .returning();
    const detail = { number, link: id, expiresAt: expiresAt?.toISOString() ?? null };
    const deed = { teamId: voice.teamId, actorId: userId, subjectId: voiceId, detail, at };
    await recordDeed(tx, { ...deed, action: "shareLink.make" });
    return { ...presentShareLink({ link: row!, number, creator: name }), url: `${ctx.site}/share/${token}` };
  });
}
