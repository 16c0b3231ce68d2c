import type { z } from "zod";

export type Method = "GET" | "POST" | "PUT" | "PATCH" | "DELETE";

export interface RouteAnswer {
  description: string;
  /** Absent where the answer has no body. */
  body?: z.ZodType;
  headers?: Record<string, string>;
}

/** One operation of the HTTP interface. The same schemas check the request and describe it. */
export interface Route {
  method: Method;
  /** As in OpenAPI: `/api/voices/{id}`. */
  path: string;
  operationId: string;
  summary: string;
  tag: "calculators" | "voices" | "team" | "account" | "service";
  session: boolean;
  /** What each variable of the path stands for, and its values where they are a closed list. */
  parameters?: Record<string, { description: string; values?: readonly string[] }>;
  query?: z.ZodObject;
  requestHeaders?: Record<string, { description: string; required: boolean }>;
  body?: z.ZodType;
  answers: Record<number, RouteAnswer>;
  /** Statuses of the problem documents it may give, besides 401 with `session` and 413, 415 and 422 with `body`. */
  problems?: readonly number[];
}
