/** The closed set of ways a request can fail. Everything a user is told about a failure starts from one of these. */
export const errorCodes = {
  "malformed-json": { status: 400, title: "The body is not JSON" },
  "no-session": { status: 401, title: "Sign in first" },
  "not-allowed": { status: 403, title: "Your role may not do this" },
  "cross-site": { status: 403, title: "The request came from another site" },
  "not-found": { status: 404, title: "Nothing here" },
  "method-not-allowed": { status: 405, title: "This address does not take that method" },
  conflict: { status: 409, title: "It clashes with what is there" },
  "stale-copy": { status: 412, title: "Someone saved a newer copy" },
  "too-large": { status: 413, title: "The body is too large" },
  "wrong-media-type": { status: 415, title: "The body must be JSON" },
  "invalid-input": { status: 422, title: "Some values cannot be used" },
  "no-circuit": { status: 422, title: "These values make no circuit" },
  "precondition-required": { status: 428, title: "If-Match is missing" },
  "too-many-requests": { status: 429, title: "Too many requests" },
  internal: { status: 500, title: "Something went wrong here" },
  busy: { status: 503, title: "Too much is being calculated" },
  unavailable: { status: 503, title: "The database cannot be reached" },
} as const satisfies Record<string, { status: number; title: string }>;

export type ErrorCode = keyof typeof errorCodes;

export interface Fault {
  /** Where the fault is, as in `parts.ra` or `stages.2.name`; empty for the body as a whole. */
  path: string;
  message: string;
}

interface Extras {
  errors?: readonly Fault[];
  /** Further members of the problem document, such as the current copy beside a stale one. */
  members?: Record<string, unknown>;
  headers?: Record<string, string>;
}

/** A failure that has been foreseen; its detail is written for the person who reads it. */
export class Refusal extends Error {
  override readonly name = "Refusal";
  readonly code: ErrorCode;
  readonly errors: readonly Fault[];
  readonly members: Record<string, unknown>;
  readonly headers: Record<string, string>;

  constructor(code: ErrorCode, detail: string, extras: Extras = {}) {
    super(detail);
    this.code = code;
    this.errors = extras.errors ?? [];
    this.members = extras.members ?? {};
    this.headers = extras.headers ?? {};
  }

  get status(): number {
    return errorCodes[this.code].status;
  }
}

/** Also for what another team owns, so that nobody learns what is there. */
export function notFound(): Refusal {
  return new Refusal("not-found", "There is nothing at this address, or it belongs to another team.");
}
