import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { findKind } from "#lib/server/calculators/find.ts";
import { describeKind } from "#lib/wire/kindDescription.ts";

export const GET = answer(({ params }) => json(describeKind(findKind(params["kind"]))));

export const ALL = methodNotAllowed("GET");
