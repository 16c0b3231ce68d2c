import { meritStatement, solveStage } from "#lib/circuit/index.ts";
import { methodNotAllowed } from "#lib/server/answer.ts";
import { calculator } from "#lib/server/calculators/calculate.ts";
import { Refusal } from "#lib/server/errors.ts";

export const POST = calculator(
  "solve",
  (schemas) => schemas.solve,
  (topology, input) => {
    const solution = solveStage(topology, input);
    if ("refused" in solution) {
      throw new Refusal("no-circuit", solution.message, {
        errors: [{ path: `targets.${solution.field}`, message: solution.message }],
      });
    }
    return { ...solution, ranking: meritStatement };
  },
);

export const ALL = methodNotAllowed("POST");
