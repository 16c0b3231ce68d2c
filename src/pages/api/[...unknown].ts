import { notFound } from "#lib/server/errors.ts";
import { problemResponse } from "#lib/server/problem.ts";
import type { APIRoute } from "astro";

/** Every address under /api that is no endpoint. */
export const ALL: APIRoute = () => problemResponse(notFound());
