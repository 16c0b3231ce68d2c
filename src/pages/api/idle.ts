import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";

/** Does nothing: what the server itself costs, for benchmarks to divide by. */
export const POST = answer(() => json({}));

export const ALL = methodNotAllowed("POST");
