import { methodNotAllowed } from "#lib/server/answer.ts";
import { calculatorApart } from "#lib/server/calculators/calculate.ts";
import { trimSchema } from "#lib/wire/trim.ts";

export const POST = calculatorApart("trimming", trimSchema);

export const ALL = methodNotAllowed("POST");
