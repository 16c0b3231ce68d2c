import type { APIContext } from "astro";
import type { z } from "zod";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { topologySchemas } from "#lib/wire/calculator.ts";
import { answer, json } from "../answer.ts";
import { calculationCosts, countCalculation } from "../calculatorLimit.ts";
import { readJson } from "../request.ts";
import { findTopology } from "./find.ts";

/** A calculator endpoint: counted, its body checked by the topology's own schema, answered by the library. */
export function calculator<Schema extends z.ZodType>(
  cost: keyof typeof calculationCosts,
  schemaOf: (schemas: ReturnType<typeof topologySchemas>) => Schema,
  compute: (topology: AnyTopology, input: z.output<Schema>) => unknown,
) {
  return answer(async ({ request, params, clientAddress }: APIContext) => {
    countCalculation(clientAddress, calculationCosts[cost]);
    const topology = findTopology(params["kind"], params["topology"]);
    return json(compute(topology, await readJson(request, schemaOf(topologySchemas(topology)))));
  });
}
