import { Refusal, type ErrorCode } from "./errors.ts";

async function unless<T>(answer: Promise<T>, codes: readonly ErrorCode[]): Promise<T | null> {
  try {
    return await answer;
  } catch (error) {
    if (error instanceof Refusal && codes.includes(error.code)) return null;
    throw error;
  }
}

/** Null where a verb finds nothing that this person may see; every other failure passes on. */
export const ifFound = <T>(answer: Promise<T>): Promise<T | null> => unless(answer, ["not-found"]);

/** Null also where the role may not see it: for pages that show the same for both. */
export const ifReadable = <T>(answer: Promise<T>): Promise<T | null> => unless(answer, ["not-found", "not-allowed"]);
