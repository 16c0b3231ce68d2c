import { Refusal } from "./errors.ts";

/** Null where a verb finds nothing that this person may see; every other failure passes on. */
export async function ifFound<T>(answer: Promise<T>): Promise<T | null> {
  try {
    return await answer;
  } catch (error) {
    if (error instanceof Refusal && error.code === "not-found") return null;
    throw error;
  }
}
