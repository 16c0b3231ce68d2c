import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readQuery } from "#lib/server/request.ts";
import { readPartsList } from "#lib/server/voices/partsList.ts";
import { wantsCsv } from "#lib/server/wantedFormat.ts";
import { partsListQuery } from "#lib/wire/partsList.ts";
import { partsListCsv } from "#lib/wire/partsListCsv.ts";

export const GET = answer(async ({ locals, params, request, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const { format, ...query } = readQuery(url, partsListQuery);
  const list = await readPartsList({ ctx, input: { id: idInPath(params), ...query } });
  if (!wantsCsv(request, format)) return json(list);
  return new Response(partsListCsv(list), {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": `attachment; filename="parts-list-${list.revision}.csv"`,
      "cache-control": "no-store",
    },
  });
});

export const ALL = methodNotAllowed("GET");
