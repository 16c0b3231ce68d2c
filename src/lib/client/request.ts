/** A fault at one place of what was sent, as problem documents list them. */
export interface Fault {
  path: string;
  message: string;
}

export type Answer<Body> =
  | { kind: "done"; body: Body; etag: string | null }
  | { kind: "signed-out" }
  | { kind: "unreachable" }
  | {
      kind: "refused";
      status: number;
      detail: string;
      errors: Fault[];
      problem: Record<string, unknown>;
      etag: string | null;
    };

interface Asked {
  method?: "GET" | "POST" | "PUT" | "PATCH" | "DELETE";
  body?: unknown;
  ifMatch?: string;
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === "object" && value !== null;

function faultsIn(problem: Record<string, unknown>): Fault[] {
  if (!Array.isArray(problem.errors)) return [];
  return problem.errors.filter(
    (fault): fault is Fault => isRecord(fault) && typeof fault.path === "string" && typeof fault.message === "string",
  );
}

/** One call of our own HTTP interface; every way it can end is a value, so that no screen forgets one. */
export async function request<Body>(
  path: string,
  { method = "GET", body, ifMatch }: Asked = {},
): Promise<Answer<Body>> {
  const headers = new Headers({ accept: "application/json" });
  if (body !== undefined) headers.set("content-type", "application/json");
  if (ifMatch !== undefined) headers.set("if-match", ifMatch);
  let response: Response;
  let content: unknown;
  try {
    response = await fetch(path, { method, headers, ...(body === undefined ? {} : { body: JSON.stringify(body) }) });
    const text = await response.text();
    content = text === "" ? null : JSON.parse(text);
  } catch {
    return { kind: "unreachable" };
  }
  // Our own server vouches for the shape of what it answers; a schema here would check it a second time.
  if (response.ok) return { kind: "done", body: content as Body, etag: response.headers.get("etag") };
  if (response.status === 401) return { kind: "signed-out" };
  const problem = isRecord(content) ? content : {};
  const detail = typeof problem.detail === "string" ? problem.detail : "The server refused this without saying why.";
  return {
    kind: "refused",
    status: response.status,
    detail,
    errors: faultsIn(problem),
    problem,
    etag: response.headers.get("etag"),
  };
}

/** Words for an answer that is not what was hoped for. */
export function failureText(answer: Exclude<Answer<unknown>, { kind: "done" }>): string {
  switch (answer.kind) {
    case "signed-out":
      return "Your sign-in has expired. Your entries stay here: sign in in another tab, then try again.";
    case "unreachable":
      return "The server could not be reached. Your entries stay here: check the connection, then try again.";
    case "refused":
      return answer.errors.length > 0 ? answer.errors.map(({ message }) => message).join(" ") : answer.detail;
  }
}
