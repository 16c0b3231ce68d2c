import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { listComments } from "#lib/server/comments/list.ts";
import { writeComment } from "#lib/server/comments/write.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson, readQuery } from "#lib/server/request.ts";
import { commentListQuery, newComment } from "#lib/wire/comment.ts";

export const GET = answer(async ({ locals, params, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  return json(await listComments({ ctx, input: { id: idInPath(params), ...readQuery(url, commentListQuery) } }));
});

export const POST = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const id = idInPath(params);
  const comment = await writeComment({ ctx, input: { id, ...(await readJson({ request, locals }, newComment)) } });
  return json(comment, { status: 201, headers: { location: `/api/voices/${id}/comments/${comment.id}` } });
});

export const ALL = methodNotAllowed("GET", "POST");
