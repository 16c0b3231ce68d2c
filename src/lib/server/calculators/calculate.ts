import type { APIContext } from "astro";
import type { z } from "zod";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { topologySchemas } from "#lib/wire/calculator.ts";
import { answer, json } from "../answer.ts";
import { countCalculation } from "../calculatorLimit.ts";
import { readJson } from "../request.ts";
import { findTopology } from "./find.ts";

type Schemas = ReturnType<typeof topologySchemas>;
type Question = "analyse" | "solve" | "curves";

/** A calculator endpoint: counted, its body checked by the topology's own schema, answered by the library. */
export function calculator<Q extends Question>(
  question: Q,
  compute: (topology: AnyTopology, input: z.output<Schemas[Q]>) => unknown,
) {
  return answer(async ({ request, params, clientAddress }: APIContext) => {
    countCalculation(clientAddress);
    const topology = findTopology(params["kind"], params["topology"]);
    const input = await readJson(request, topologySchemas(topology)[question] as Schemas[Q]);
    return json(compute(topology, input));
  });
}
