import { faultText } from "#lib/wire/faultText.ts";
import type { APIContext } from "astro";
import type { z } from "zod";
import { notFound, Refusal } from "./errors.ts";
import { faultsOf } from "./faults.ts";

const bodyLimit = 1_000_000;

const tooLarge = (limitBytes: number) =>
  new Refusal("too-large", `The body may hold at most ${Math.floor(limitBytes / 1000)} kB. Nothing was changed.`);

async function readChunks(body: ReadableStream<Uint8Array>, limitBytes: number): Promise<Buffer> {
  const chunks: Uint8Array[] = [];
  let size = 0;
  for await (const chunk of body as unknown as AsyncIterable<Uint8Array>) {
    size += chunk.byteLength;
    if (size > limitBytes) throw tooLarge(limitBytes);
    chunks.push(chunk);
  }
  return Buffer.concat(chunks);
}

async function readBytes({ request, locals }: Received, limitBytes: number): Promise<Uint8Array> {
  if (locals.body) {
    if (locals.body.byteLength > limitBytes) throw tooLarge(limitBytes);
    return locals.body;
  }
  if (Number(request.headers.get("content-length") ?? 0) > limitBytes) throw tooLarge(limitBytes);
  return request.body ? readChunks(request.body, limitBytes) : new Uint8Array();
}

async function readText(received: Received, limitBytes: number): Promise<string> {
  const bytes = await readBytes(received, limitBytes);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    throw new Refusal("malformed-json", "The body is not UTF-8 text. Nothing was changed.");
  }
}

function parseJson(text: string): unknown {
  if (text.trim() === "") {
    throw new Refusal("malformed-json", "The body is empty. Send a JSON object. Nothing was changed.");
  }
  try {
    return JSON.parse(text) as unknown;
  } catch {
    throw new Refusal("malformed-json", "The body could not be read as JSON. Nothing was changed.");
  }
}

/** Checks what came from outside against the schema that the interface description is made of. */
export function parseInput<Schema extends z.ZodType>(value: unknown, schema: Schema): z.output<Schema> {
  const parsed = schema.safeParse(value, { error: faultText });
  if (parsed.success) return parsed.data;
  const errors = faultsOf(parsed.error);
  const places = errors.length === 1 ? "one place" : `${errors.length} places`;
  throw new Refusal("invalid-input", `What was sent is wrong in ${places}. Nothing was changed.`, { errors });
}

/** What of an endpoint's context is needed to read its body. */
export type Received = Pick<APIContext, "request"> & { locals: Pick<App.Locals, "body"> };

/** Reads a JSON body of bounded size and checks it. */
export async function readJson<Schema extends z.ZodType>(
  received: Received,
  schema: Schema,
  { limitBytes = bodyLimit }: { limitBytes?: number } = {},
): Promise<z.output<Schema>> {
  const mediaType = (received.request.headers.get("content-type") ?? "").split(";", 1)[0]?.trim().toLowerCase() ?? "";
  if (mediaType !== "application/json" && !/^application\/[\w.-]+\+json$/.test(mediaType)) {
    throw new Refusal("wrong-media-type", "Send the body as JSON, with the header Content-Type: application/json.");
  }
  return parseInput(parseJson(await readText(received, limitBytes)), schema);
}

/** Reads the query of an address; a name given twice counts as its last value. */
export function readQuery<Schema extends z.ZodType>(url: URL, schema: Schema): z.output<Schema> {
  return parseInput(Object.fromEntries(url.searchParams), schema);
}

/** An id in the address. One that we can never have given out names nothing, and is not looked for. */
export function idInPath(params: Record<string, string | undefined>, name = "id"): string {
  const value = params[name];
  if (value === undefined || !/^[a-z]{3}_[0-9a-z]{1,40}$/.test(value)) throw notFound();
  return value;
}
