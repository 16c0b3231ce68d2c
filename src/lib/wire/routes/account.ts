import { z } from "zod";
import type { Route } from "./route.ts";

const problems = [400, 403, 415, 429];

/** The part of the sign-in that scripts need; the sign-in checks these requests itself. */
export const accountRoutes: readonly Route[] = [
  {
    method: "POST",
    path: "/api/auth/sign-in/email",
    operationId: "signIn",
    summary: "Sign in; the answer sets the session cookie",
    tag: "account",
    session: false,
    body: z.object({ email: z.email(), password: z.string() }),
    answers: {
      200: {
        description: "Signed in",
        body: z.object({ token: z.string(), user: z.object({ id: z.string(), email: z.string(), name: z.string() }) }),
        headers: { "Set-Cookie": "The session" },
      },
    },
    problems: [401, ...problems],
  },
  {
    method: "POST",
    path: "/api/auth/sign-up/email",
    operationId: "signUp",
    summary: "Make an account; a mail asks to confirm its address",
    tag: "account",
    session: false,
    body: z.object({ name: z.string(), email: z.email(), password: z.string().min(8).max(128) }),
    answers: { 200: { description: "The mail is on its way", body: z.object({ token: z.null() }) } },
    problems,
  },
  {
    method: "POST",
    path: "/api/auth/sign-out",
    operationId: "signOut",
    summary: "End the session",
    tag: "account",
    session: false,
    body: z.object({}),
    answers: { 200: { description: "Signed out", body: z.object({ success: z.boolean() }) } },
    problems,
  },
];
