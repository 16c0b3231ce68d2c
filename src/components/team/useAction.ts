import { useState } from "react";
import { failureText, request, type Answer } from "#lib/client/request.ts";

interface Asked {
  method: "POST" | "PATCH" | "DELETE";
  body?: unknown;
}

/** One deed at a time through our own interface; afterwards the page is drawn anew, since much of it may have changed. */
export function useAction() {
  const [busy, setBusy] = useState(false);
  const [failure, setFailure] = useState<string | null>(null);

  const run = async <Body>(path: string, asked: Asked, done: (body: Body) => void = () => window.location.reload()) => {
    if (busy) return;
    setBusy(true);
    setFailure(null);
    const answer: Answer<Body> = await request<Body>(path, asked);
    setBusy(false);
    if (answer.kind === "done") done(answer.body);
    else setFailure(failureText(answer));
  };
  return { busy, failure, run };
}
