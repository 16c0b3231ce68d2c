import { z } from "zod";
import { healthAnswer } from "../health.ts";
import type { Route } from "./route.ts";

export const serviceRoutes: readonly Route[] = [
  {
    method: "GET",
    path: "/api/health",
    operationId: "readHealth",
    summary: "Whether the server and its database work",
    tag: "service",
    session: false,
    answers: { 200: { description: "Both work", body: healthAnswer } },
    problems: [503],
  },
  {
    method: "GET",
    path: "/api/openapi.json",
    operationId: "readInterface",
    summary: "This description",
    tag: "service",
    session: false,
    answers: { 200: { description: "An OpenAPI 3.1 document", body: z.record(z.string(), z.unknown()) } },
  },
  {
    method: "POST",
    path: "/api/idle",
    operationId: "doNothing",
    summary: "Does nothing: what the server itself costs, for benchmarks to divide by",
    tag: "service",
    session: false,
    answers: { 200: { description: "Nothing was done", body: z.object({}) } },
  },
];
