import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { database } from "#lib/server/database.ts";
import { readHealth } from "#lib/server/health.ts";

export const GET = answer(async () => json(await readHealth({ db: database() })));

export const ALL = methodNotAllowed("GET");
