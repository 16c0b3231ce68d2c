import type { SaveOutcome } from "./workingCopy.ts";

/** Words for a change of the working copy that did not come about. */
export function saveFailure(outcome: Exclude<SaveOutcome, { kind: "saved" }>): string {
  switch (outcome.kind) {
    case "conflict":
      return "Someone else is saving this voice just now. Nothing was changed: load the page again and repeat it.";
    case "signed-out":
      return "Your sign-in has expired. Nothing was changed: sign in in another tab, then repeat it.";
    case "unreachable":
      return "The server could not be reached. Nothing was changed: check the connection, then repeat it.";
    case "refused":
      return [outcome.detail, ...outcome.errors.map(({ message }) => message)].join(" ");
  }
}
