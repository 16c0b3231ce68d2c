import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf } from "#lib/server/context.ts";
import { readTeamMembers } from "#lib/server/teams/read.ts";

export const GET = answer(async ({ locals }) => json({ members: await readTeamMembers({ ctx: contextOf(locals) }) }));

export const ALL = methodNotAllowed("GET");
