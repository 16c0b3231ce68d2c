/** Speaks to the running application as a script would: JSON in and out, with a session cookie if signed in. */
export interface Client {
  request(method: string, path: string, options?: RequestOptions): Promise<Reply>;
}

export interface RequestOptions {
  json?: unknown;
  /** A body sent as it is. */
  text?: string;
  headers?: Record<string, string>;
}

export interface Reply {
  status: number;
  headers: Headers;
  /** The parsed body; undefined where there is none. */
  // eslint-disable-next-line @typescript-eslint/no-explicit-any -- what came over the wire has no type yet; each test says what it expects
  body: any;
}

export function clientOf(url: string, cookie?: string): Client {
  return {
    async request(method, path, { json, text, headers = {} } = {}) {
      const body = json === undefined ? text : JSON.stringify(json);
      const response = await fetch(`${url}${path}`, {
        method,
        redirect: "manual",
        headers: {
          ...(body === undefined ? {} : { "content-type": "application/json" }),
          ...(cookie ? { cookie } : {}),
          ...headers,
        },
        ...(body === undefined ? {} : { body }),
      });
      const type = response.headers.get("content-type") ?? "";
      const answered = await response.text();
      const parsed: unknown = /json/.test(type) && answered ? JSON.parse(answered) : answered || undefined;
      return { status: response.status, headers: response.headers, body: parsed };
    },
  };
}

/** The cookies an answer sets, as a request sends them back. */
export function cookiesOf({ headers }: Reply): string {
  return headers
    .getSetCookie()
    .map((cookie) => cookie.split(";", 1)[0])
    .join("; ");
}

export const demoPassword = "clatter-demo-1";

export type SignedIn = Client & { cookie: string };

export async function signIn(url: string, email: string, password = demoPassword): Promise<SignedIn> {
  const reply = await clientOf(url).request("POST", "/api/auth/sign-in/email", { json: { email, password } });
  if (reply.status !== 200)
    throw new Error(`${email} could not sign in: ${reply.status} ${JSON.stringify(reply.body)}`);
  const cookie = cookiesOf(reply);
  return { ...clientOf(url, cookie), cookie };
}
