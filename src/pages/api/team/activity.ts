import { listActivity } from "#lib/server/activity/list.ts";
import { answer, csv, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { readQuery } from "#lib/server/request.ts";
import { wantsCsv } from "#lib/server/wantedFormat.ts";
import { activityQuery } from "#lib/wire/activity.ts";
import { activityCsv } from "#lib/wire/activityText.ts";

export const GET = answer(async ({ locals, request, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const query = readQuery(url, activityQuery);
  const page = await listActivity({ ctx, input: query });
  return wantsCsv(request, query.format) ? csv("activity.csv", activityCsv(page.events)) : json(page);
});

export const ALL = methodNotAllowed("GET");
