import { analyseStage } from "#lib/circuit/index.ts";
import { methodNotAllowed } from "#lib/server/answer.ts";
import { calculator } from "#lib/server/calculators/calculate.ts";

export const POST = calculator(
  "analyse",
  (schemas) => schemas.analyse,
  (topology, input) => {
    const { results, warnings, state } = analyseStage(topology, input);
    return input.targets ? { results, warnings, state } : { results, warnings };
  },
);

export const ALL = methodNotAllowed("POST");
