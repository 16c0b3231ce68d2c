import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { compareRevisions } from "#lib/server/compare/compare.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readQuery } from "#lib/server/request.ts";
import { wantsCsv } from "#lib/server/wantsCsv.ts";
import { compareQuery } from "#lib/wire/compare.ts";
import { compareCsv } from "#lib/wire/compareCsv.ts";

export const GET = answer(async ({ locals, params, request, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const { format, ...query } = readQuery(url, compareQuery);
  const csv = wantsCsv(request, format);
  const found = await compareRevisions({
    ctx,
    input: { id: idInPath(params), ...query, ...(csv ? { curves: "none" } : {}) },
  });
  if (!csv) return json(found);
  const name = `compare-${found.from.revision}-${found.to.revision}.csv`;
  return new Response(compareCsv(found), {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": `attachment; filename="${name}"`,
      "cache-control": "no-store",
    },
  });
});

export const ALL = methodNotAllowed("GET");
