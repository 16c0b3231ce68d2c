// A thread of the server's pool: calculates what it is told, one task after the other. See src/lib/server/pool.
import { parentPort } from "node:worker_threads";
import { calculations } from "#lib/circuit/analysis/calculations.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import type { CalculationTask } from "#lib/server/pool/calculations.ts";

function calculate({ calculation, kind, topology, request }: CalculationTask): unknown {
  const found = stageKinds.find(({ id }) => id === kind)?.topologies.find(({ id }) => id === topology);
  if (!found) throw new Error(`There is no topology ${topology} of ${kind}.`);
  const steps = calculations[calculation](found, request as never);
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

parentPort?.on("message", (task: CalculationTask) => {
  try {
    parentPort?.postMessage({ answer: calculate(task) });
  } catch (error) {
    parentPort?.postMessage({ failed: error instanceof Error ? (error.stack ?? error.message) : String(error) });
  }
});
