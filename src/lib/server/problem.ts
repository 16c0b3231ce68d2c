import { errorCodes, Refusal } from "./errors.ts";
import { log } from "./log.ts";

const unreachable = new Set([
  "ECONNREFUSED",
  "ECONNRESET",
  "ENOTFOUND",
  "ETIMEDOUT",
  "CONNECT_TIMEOUT",
  "CONNECTION_CLOSED",
  "CONNECTION_ENDED",
  "CONNECTION_DESTROYED",
  "57P01", // the server is shutting down
  "57P03", // the server is starting up
  "53300", // it has no connection left
]);

/** Drizzle and the driver wrap what they catch, so the code is looked for along the chain of causes. */
function isUnreachable(error: unknown): boolean {
  for (let at = error, depth = 0; at instanceof Error && depth < 6; at = at.cause, depth += 1) {
    if ("code" in at && typeof at.code === "string" && unreachable.has(at.code)) return true;
  }
  return false;
}

/** Turns whatever was thrown into a refusal. Text of unforeseen errors goes to the log and never to the user. */
export function toRefusal(error: unknown): Refusal {
  if (error instanceof Refusal) return error;
  log().error({ err: error }, "a request failed");
  if (isUnreachable(error)) {
    return new Refusal(
      "unavailable",
      "The database cannot be reached just now. What you sent was not saved; keep it and try again shortly.",
      { headers: { "retry-after": "5" } },
    );
  }
  return new Refusal(
    "internal",
    "The request could not be carried out because of a fault on the server, and nothing was changed. Try again; if it happens again, tell whoever runs this server.",
  );
}

export function problemDocument(refusal: Refusal): Record<string, unknown> {
  const { status, title } = errorCodes[refusal.code];
  return {
    ...refusal.members,
    type: `urn:clatterbench:problem:${refusal.code}`,
    title,
    status,
    detail: refusal.message,
    ...(refusal.errors.length > 0 ? { errors: refusal.errors } : {}),
  };
}

/** The one way from an error to an answer: an RFC 9457 problem document. */
export function problemResponse(error: unknown): Response {
  const refusal = toRefusal(error);
  return new Response(JSON.stringify(problemDocument(refusal)), {
    status: refusal.status,
    headers: { ...refusal.headers, "content-type": "application/problem+json", "cache-control": "no-store" },
  });
}
