import { newVoice, voiceAnswer, voiceChange, voiceListAnswer, voiceListQuery } from "../voice.ts";
import { workingCopyAnswer, workingCopyDocument } from "../workingCopy.ts";
import type { Route } from "./route.ts";

const common = { tag: "voices", session: true } as const;
const one = { ...common, parameters: { id: { description: "Id of the voice" } } } as const;
const etag = { ETag: "Names this state of the working copy; send it back as If-Match" };

export const voiceRoutes: readonly Route[] = [
  {
    ...common,
    method: "GET",
    path: "/api/voices",
    operationId: "listVoices",
    summary: "The voices of your team",
    query: voiceListQuery,
    answers: { 200: { description: "One page of voices", body: voiceListAnswer } },
    problems: [403, 422],
  },
  {
    ...common,
    method: "POST",
    path: "/api/voices",
    operationId: "createVoice",
    summary: "Begin a voice",
    body: newVoice,
    answers: { 201: { description: "The new voice", body: voiceAnswer, headers: { Location: "Its address" } } },
    problems: [403],
  },
  {
    ...one,
    method: "GET",
    path: "/api/voices/{id}",
    operationId: "readVoice",
    summary: "One voice",
    answers: { 200: { description: "The voice", body: voiceAnswer } },
    problems: [404],
  },
  {
    ...one,
    method: "PATCH",
    path: "/api/voices/{id}",
    operationId: "renameVoice",
    summary: "Rename a voice",
    body: voiceChange,
    answers: { 200: { description: "The renamed voice", body: voiceAnswer } },
    problems: [403, 404],
  },
  {
    ...one,
    method: "DELETE",
    path: "/api/voices/{id}",
    operationId: "removeVoice",
    summary: "Remove a voice and all it holds",
    answers: { 204: { description: "It is gone" } },
    problems: [403, 404],
  },
  {
    ...one,
    method: "GET",
    path: "/api/voices/{id}/working-copy",
    operationId: "readWorkingCopy",
    summary: "Stages, links and conditions as one document",
    requestHeaders: { "If-None-Match": { description: "Answers 304 when this is still the state", required: false } },
    answers: {
      200: { description: "The working copy", body: workingCopyAnswer, headers: etag },
      304: { description: "Nothing changed since" },
    },
    problems: [403, 404],
  },
  {
    ...one,
    method: "PUT",
    path: "/api/voices/{id}/working-copy",
    operationId: "saveWorkingCopy",
    summary: "Save stages, links and conditions as one document",
    requestHeaders: { "If-Match": { description: "The ETag last read", required: true } },
    body: workingCopyDocument,
    answers: { 200: { description: "The saved working copy", body: workingCopyAnswer, headers: etag } },
    problems: [403, 404, 412, 428],
  },
];
