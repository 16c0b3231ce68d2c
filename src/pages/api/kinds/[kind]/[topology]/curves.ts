import { plotStage } from "#lib/circuit/index.ts";
import { methodNotAllowed } from "#lib/server/answer.ts";
import { calculator } from "#lib/server/calculators/calculate.ts";

export const POST = calculator(
  "curves",
  (schemas) => schemas.curves,
  (topology, input) => ({ curves: plotStage(topology, input) }),
);

export const ALL = methodNotAllowed("POST");
