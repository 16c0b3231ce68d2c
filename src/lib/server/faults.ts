import type { z } from "zod";
import type { Fault } from "./errors.ts";

const mostFaults = 100;

/** One fault for each wrong place; an extra field is reported at its own path. */
export function faultsOf(error: z.ZodError): Fault[] {
  const faults = error.issues.flatMap((issue): Fault[] => {
    const path = issue.path.map(String);
    if (issue.code !== "unrecognized_keys") return [{ path: path.join("."), message: issue.message }];
    return issue.keys.map((key) => ({ path: [...path, key].join("."), message: issue.message }));
  });
  return faults.slice(0, mostFaults);
}
