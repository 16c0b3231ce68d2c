import type { APIContext } from "astro";
import type { z } from "zod";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { topologySchemas } from "#lib/wire/calculator.ts";
import { answer, json } from "../answer.ts";
import { calculationCosts, countCalculation } from "../calculatorLimit.ts";
import { readJson } from "../request.ts";
import type { Calculation, CalculationRequest } from "#lib/circuit/analysis/calculations.ts";
import { calculateApart } from "../pool/calculations.ts";
import { findTopology } from "./find.ts";

/** A calculator endpoint: counted, its body checked by the topology's own schema, answered by the library. */
export function calculator<Schema extends z.ZodType>(
  cost: keyof typeof calculationCosts,
  schemaOf: (schemas: ReturnType<typeof topologySchemas>) => Schema,
  compute: (topology: AnyTopology, input: z.output<Schema>) => unknown,
) {
  return answer(async ({ request, locals, params, clientAddress }: APIContext) => {
    countCalculation(clientAddress, calculationCosts[cost]);
    const topology = findTopology(params["kind"], params["topology"]);
    return json(compute(topology, await readJson({ request, locals }, schemaOf(topologySchemas(topology)))));
  });
}

/** What a calculation apart costs before it is read, in analyses. */
const costApart = 50;
/** Boards that weigh as much as one analysis: they hold up a thread of the pool, not the server. */
const boardsPerAnalysis = 20;

/** The same for what takes longer: calculated on a thread of the pool, and given up when the asker goes away. */
export function calculatorApart<C extends Calculation, Schema extends z.ZodType<CalculationRequest<C>>>(
  calculation: C,
  schemaOf: (topology: AnyTopology) => Schema,
) {
  return answer(async ({ request, locals, params, clientAddress }: APIContext) => {
    countCalculation(clientAddress, costApart);
    const { kind, topology: id } = params;
    const topology = findTopology(kind, id);
    const asked: CalculationRequest<C> = await readJson({ request, locals }, schemaOf(topology));
    if ("boards" in asked) countCalculation(clientAddress, asked.boards / boardsPerAnalysis);
    return json(
      await calculateApart({ calculation, kind: kind!, topology: topology.id, request: asked }, request.signal),
    );
  });
}
