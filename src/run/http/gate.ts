import type { IncomingMessage, RequestListener, ServerResponse } from "node:http";
import compression from "compression";
import { log } from "#lib/server/log.ts";
import { attachBody, discardBody, readBody } from "./body.ts";
import type { FileServer } from "./files.ts";
import { vouchForHeaders, type Reached } from "./forwarded.ts";
import { isForgedWrite } from "./origin.ts";
import { refuse } from "./problem.ts";

/** Astro's handler: what is given as locals is what endpoints find in theirs. */
export type Application = (
  request: IncomingMessage,
  response: ServerResponse,
  next: undefined,
  locals: { body?: Uint8Array },
) => Promise<void>;

/** Half as much again as the largest body an endpoint reads, so that an endpoint answers for its own limit. */
export const bodyLimit = 1.5 * 1024 * 1024;

// A Request of the web platform cannot be made of the others, TRACE among them.
const methods = new Set(["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"]);

export interface Gate extends Reached {
  files: FileServer;
  application: Application;
}

/** All that a request passes before the application sees it. */
export function gate({ files, application, ...reached }: Gate): RequestListener {
  const compress = compression() as unknown as (
    request: IncomingMessage,
    response: ServerResponse,
    next: () => void,
  ) => void;

  async function admit(request: IncomingMessage, response: ServerResponse) {
    if (!methods.has(request.method ?? "")) {
      discardBody(request);
      response.setHeader("Allow", [...methods].join(", "));
      refuse(request, response, "method-not-allowed", `No address here takes ${request.method}.`);
      return;
    }
    vouchForHeaders(request, reached);
    if (isForgedWrite(request)) {
      discardBody(request);
      refuse(
        request,
        response,
        "cross-site",
        "The request changes something but was sent by a page of another site. Nothing was changed; open the page here and try again.",
      );
      return;
    }
    await new Promise<void>((next) => compress(request, response, next));
    if (request.method === "GET" || request.method === "HEAD") {
      const served = await files(request, response);
      if (served) return;
    } else {
      const body = await readBody(request, bodyLimit);
      if (body.kind === "broken-off") return;
      if (body.kind === "too-large") {
        // The connection stays open: a sender that finds it closed while still writing may never read the answer.
        discardBody(request);
        refuse(
          request,
          response,
          "too-large",
          "The request is larger than 1 MB. Nothing was changed; send less at once.",
        );
        return;
      }
      attachBody(request, body.bytes);
      await application(request, response, undefined, { body: body.bytes });
      return;
    }
    await application(request, response, undefined, {});
  }

  return (request, response) => {
    admit(request, response).catch((error: unknown) => {
      log().error({ err: error }, "a request failed before the application");
      if (response.headersSent) response.destroy();
      else
        refuse(
          request,
          response,
          "internal",
          "The server is at fault, and the fault was noted. Try again in a moment.",
        );
    });
  };
}
