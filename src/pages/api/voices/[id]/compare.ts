import { answer, csv, json, methodNotAllowed } from "#lib/server/answer.ts";
import { compareRevisions } from "#lib/server/compare/compare.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readQuery } from "#lib/server/request.ts";
import { wantsCsv } from "#lib/server/wantedFormat.ts";
import { compareQuery } from "#lib/wire/compare.ts";
import { compareCsv } from "#lib/wire/compareCsv.ts";

export const GET = answer(async ({ locals, params, request, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const { format, ...query } = readQuery(url, compareQuery);
  const asCsv = wantsCsv(request, format);
  const more = asCsv ? { curves: "none" as const } : {};
  const found = await compareRevisions({ ctx, input: { id: idInPath(params), ...query, ...more } });
  if (!asCsv) return json(found);
  return csv(`compare-${found.from.revision}-${found.to.revision}.csv`, compareCsv(found));
});

export const ALL = methodNotAllowed("GET");
