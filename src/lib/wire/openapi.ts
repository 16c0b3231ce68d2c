import { z } from "zod";
import { problemAnswer } from "./problem.ts";
import type { Route } from "./routes/index.ts";

type Json = Record<string, unknown>;

const problemTexts: Record<number, string> = {
  400: "The body is not JSON",
  401: "No session",
  403: "The role may not do this",
  404: "Nothing there, or another team's",
  409: "It clashes with what is there",
  412: "Someone saved a newer copy; `current` holds it",
  413: "The body is too large",
  415: "The body is not JSON",
  422: "Some values cannot be used; `errors` names each place",
  428: "If-Match is missing",
  429: "Too many requests; Retry-After says when to go on",
  503: "The database cannot be reached, or too much is being calculated; Retry-After says when to go on",
};

function schemaOf(schema: z.ZodType, io: "input" | "output"): Json {
  // Checks that JSON Schema has no word for, such as unique designators, are left out; the types stay exact.
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: "any" }) as Json;
  return rest;
}

function parametersOf(route: Route): Json[] {
  const query = route.query ? schemaOf(route.query, "input") : {};
  const properties = (query.properties ?? {}) as Record<string, Json>;
  const required = (query.required ?? []) as string[];
  return [
    ...Object.entries(route.parameters ?? {}).map(([name, { description, values }]) => ({
      name,
      in: "path",
      required: true,
      description,
      schema: { type: "string", ...(values ? { enum: values } : {}) },
    })),
    ...Object.entries(properties).map(([name, schema]) => ({
      name,
      in: "query",
      required: required.includes(name),
      schema,
    })),
    ...Object.entries(route.requestHeaders ?? {}).map(([name, header]) => ({
      name,
      in: "header",
      ...header,
      schema: { type: "string" },
    })),
  ];
}

function problemsOf(route: Route): number[] {
  const statuses = new Set(route.problems ?? []);
  if (route.session) statuses.add(401);
  if (route.body) for (const status of [400, 413, 415, 422]) statuses.add(status);
  return [...statuses].sort((a, b) => a - b);
}

function answersOf(route: Route): Json {
  const answers: Json = {};
  for (const [status, { description, body, headers }] of Object.entries(route.answers)) {
    answers[status] = {
      description,
      ...(headers
        ? {
            headers: Object.fromEntries(
              Object.entries(headers).map(([name, text]) => [name, { description: text, schema: { type: "string" } }]),
            ),
          }
        : {}),
      ...(body ? { content: { "application/json": { schema: schemaOf(body, "output") } } } : {}),
    };
  }
  for (const status of problemsOf(route)) {
    answers[status] = {
      description: problemTexts[status] ?? "A problem",
      content: { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } },
    };
  }
  return answers;
}

function operationOf(route: Route): Json {
  return {
    operationId: route.operationId,
    summary: route.summary,
    tags: [route.tag],
    security: route.session ? [{ session: [] }, { key: [] }] : [],
    parameters: parametersOf(route),
    ...(route.body
      ? { requestBody: { required: true, content: { "application/json": { schema: schemaOf(route.body, "input") } } } }
      : {}),
    responses: answersOf(route),
  };
}

/** The description of the HTTP interface, made from the schemas that check its requests. */
export function openApiDocument(routes: readonly Route[], version: string): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) (paths[route.path] ??= {})[route.method.toLowerCase()] = operationOf(route);
  return {
    openapi: "3.1.0",
    info: {
      title: "Clatterbench",
      version,
      description:
        "Calculations of analog percussion voices, and the designs a team keeps. All numbers are in SI base units.",
    },
    paths,
    components: {
      schemas: { Problem: schemaOf(problemAnswer, "output") },
      securitySchemes: {
        session: { type: "apiKey", in: "cookie", name: "clatterbench.session_token", description: "Set by signing in" },
        key: { type: "http", scheme: "bearer", description: "A personal key, made on the account page" },
      },
    },
  };
}
