import type { IncomingMessage } from "node:http";

/** What the body of a request turned out to be. */
export type Body = { kind: "whole"; bytes: Buffer } | { kind: "too-large" } | { kind: "broken-off" };

/** Reads a body to its end, but keeps no more than `limit` bytes of it. */
export function readBody(request: IncomingMessage, limit: number): Promise<Body> {
  if (Number(request.headers["content-length"] ?? 0) > limit) return Promise.resolve({ kind: "too-large" });
  return new Promise((resolve) => {
    const chunks: Buffer[] = [];
    let length = 0;
    const settle = (body: Body) => {
      request.removeAllListeners("data");
      resolve(body);
    };
    request.on("data", (chunk: Buffer) => {
      length += chunk.length;
      if (length > limit) settle({ kind: "too-large" });
      else chunks.push(chunk);
    });
    request.once("end", () => settle({ kind: "whole", bytes: Buffer.concat(chunks) }));
    request.once("error", () => settle({ kind: "broken-off" }));
    request.once("close", () => settle({ kind: "broken-off" }));
  });
}

/**
 * Takes and throws away what a refused sender is still sending: one that is cut off in the middle of its body often
 * reports a lost connection instead of the answer. Not for ever, though.
 */
export function discardBody(request: IncomingMessage, { limit = 64 * 1024 * 1024, milliseconds = 5000 } = {}): void {
  let length = 0;
  const giveUp = () => request.destroy();
  const timer = setTimeout(giveUp, milliseconds);
  timer.unref();
  request.on("data", (chunk: Buffer) => {
    length += chunk.length;
    if (length > limit) giveUp();
  });
  request.once("close", () => clearTimeout(timer));
  request.resume();
}

/**
 * Hands bytes already read to Astro's adapter, which takes `request.body` for its own if it is iterable and has no
 * enumerable keys.
 */
export function attachBody(request: IncomingMessage, bytes: Buffer): void {
  async function* once() {
    await Promise.resolve();
    if (bytes.length > 0) yield bytes;
  }
  Object.assign(request, { body: once() });
}
