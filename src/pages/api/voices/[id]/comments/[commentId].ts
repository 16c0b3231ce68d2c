import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { changeComment, deleteComment } from "#lib/server/comments/change.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson } from "#lib/server/request.ts";
import { commentChange } from "#lib/wire/comment.ts";

export const PATCH = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const input = { id: idInPath(params), commentId: idInPath(params, "commentId") };
  return json(
    await changeComment({ ctx, input: { ...input, ...(await readJson({ request, locals }, commentChange)) } }),
  );
});

export const DELETE = answer(async ({ locals, params }) => {
  const input = { id: idInPath(params), commentId: idInPath(params, "commentId") };
  await deleteComment({ ctx: contextOf(locals), input });
  return new Response(null, { status: 204 });
});

export const ALL = methodNotAllowed("PATCH", "DELETE");
