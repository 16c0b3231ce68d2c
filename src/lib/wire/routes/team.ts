import { apiKeyListAnswer, newApiKey, newApiKeyAnswer } from "../apiKey.ts";
import { sessionListAnswer } from "../session.ts";
import { handOver, memberListAnswer, roleChange } from "../team.ts";
import type { Route } from "./route.ts";

const team = { tag: "team", session: true } as const;
const account = { tag: "account", session: true } as const;

export const teamRoutes: readonly Route[] = [
  {
    ...team,
    method: "GET",
    path: "/api/team/members",
    operationId: "listMembers",
    summary: "Who belongs to your team",
    answers: { 200: { description: "By role, then by name", body: memberListAnswer } },
    problems: [403],
  },
  {
    ...team,
    method: "PATCH",
    path: "/api/team/members/{userId}",
    operationId: "changeRole",
    summary: "Give a member another role",
    parameters: { userId: { description: "Id of the person" } },
    body: roleChange,
    answers: { 204: { description: "Done" } },
    problems: [403, 404, 409],
  },
  {
    ...team,
    method: "DELETE",
    path: "/api/team/members/{userId}",
    operationId: "removeMember",
    summary: "Take a member out of the team, or leave it yourself; what they made stays",
    parameters: { userId: { description: "Id of the person" } },
    answers: { 204: { description: "Done" } },
    problems: [403, 404, 409],
  },
  {
    ...team,
    method: "POST",
    path: "/api/team/ownership",
    operationId: "handOverTeam",
    summary: "Make another member an owner, and yourself a designer",
    body: handOver,
    answers: { 204: { description: "Done" } },
    problems: [403, 404, 409],
  },
  {
    ...account,
    method: "GET",
    path: "/api/account/keys",
    operationId: "listApiKeys",
    summary: "Your personal keys for scripts",
    answers: { 200: { description: "Newest first", body: apiKeyListAnswer } },
    problems: [403],
  },
  {
    ...account,
    method: "POST",
    path: "/api/account/keys",
    operationId: "makeApiKey",
    summary: "Make a key that acts in your present team with your role; not by another key",
    body: newApiKey,
    answers: { 201: { description: "The key, shown this once", body: newApiKeyAnswer } },
    problems: [403, 409],
  },
  {
    ...account,
    method: "DELETE",
    path: "/api/account/keys/{id}",
    operationId: "revokeApiKey",
    summary: "End one of your keys at once",
    parameters: { id: { description: "Id of the key" } },
    answers: { 204: { description: "It no longer works" } },
    problems: [403, 404],
  },
  {
    ...account,
    method: "GET",
    path: "/api/account/sessions",
    operationId: "listSessions",
    summary: "Where you are signed in",
    answers: { 200: { description: "Latest used first", body: sessionListAnswer } },
    problems: [403],
  },
  {
    ...account,
    method: "DELETE",
    path: "/api/account/sessions/{id}",
    operationId: "endSession",
    summary: "Sign out there",
    parameters: { id: { description: "Id of the session" } },
    answers: { 204: { description: "It is signed out" } },
    problems: [403, 404],
  },
];
