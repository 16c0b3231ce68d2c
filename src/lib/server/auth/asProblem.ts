import { problemResponse } from "../problem.ts";

async function membersOf(response: Response): Promise<Record<string, unknown>> {
  const text = await response.text();
  try {
    const parsed: unknown = JSON.parse(text);
    if (parsed && typeof parsed === "object") return { ...parsed };
  } catch {
    // better-auth answers some refusals without a body, or with plain text.
  }
  return {};
}

/** Gives better-auth's refusals the shape of ours, keeping the `code` and `message` its browser client reads. */
export async function asProblem(response: Response): Promise<Response> {
  if (response.status < 400) return response;
  if (response.status >= 500) return problemResponse(new Error(`the sign-in answered ${response.status}`));
  const { code, message, ...rest } = await membersOf(response);
  const detail = typeof message === "string" && message !== "" ? message : "The request was refused.";
  const word = typeof code === "string" ? code.toLowerCase().replaceAll("_", "-") : "refused";
  const headers = new Headers(response.headers);
  headers.set("content-type", "application/problem+json");
  headers.delete("content-length");
  const retryAfter = headers.get("x-retry-after");
  if (retryAfter) headers.set("retry-after", retryAfter);
  const document = {
    ...rest,
    type: `urn:clatterbench:problem:account:${word}`,
    title: "The sign-in refused this",
    status: response.status,
    detail,
    code: typeof code === "string" ? code : "REFUSED",
    message: detail,
  };
  return new Response(JSON.stringify(document), { status: response.status, headers });
}
