import { methodNotAllowed } from "#lib/server/answer.ts";
import { calculatorApart } from "#lib/server/calculators/calculate.ts";
import { spreadSchema } from "#lib/wire/spread.ts";

export const POST = calculatorApart("spread", spreadSchema);

export const ALL = methodNotAllowed("POST");
