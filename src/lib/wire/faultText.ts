import type { z } from "zod";

const kindWords: Record<string, string> = {
  string: "text",
  number: "a number",
  int: "a whole number",
  boolean: "true or false",
  array: "a list",
  object: "an object",
  record: "an object",
};

const wordFor = (kind: string) => kindWords[kind] ?? kind;

/** Says in the product's own words what zod found; schemas that carry a message of their own keep it. */
export function faultText(issue: z.core.$ZodRawIssue): string | undefined {
  switch (issue.code) {
    case "invalid_type":
      return issue.input === undefined
        ? `Missing: ${wordFor(issue.expected)} belongs here.`
        : `This should be ${wordFor(issue.expected)}.`;
    case "unrecognized_keys":
      return "Nothing of this name belongs here.";
    case "invalid_value":
      return `This should be ${issue.values.map((value) => JSON.stringify(value)).join(" or ")}.`;
    case "too_big":
      if (issue.origin === "string") return `At most ${issue.maximum} characters.`;
      if (issue.origin === "array") return `At most ${issue.maximum} entries.`;
      return `At most ${issue.maximum}.`;
    case "too_small":
      if (issue.origin === "string") {
        return issue.minimum === 1 ? "This cannot be empty." : `At least ${issue.minimum} characters.`;
      }
      if (issue.origin === "array") return `At least ${issue.minimum} entries.`;
      return `At least ${issue.minimum}.`;
    default:
      return undefined;
  }
}
