import { compareAnswer, compareQuery } from "../compare.ts";
import {
  newRevision,
  recomputeAnswer,
  reviewDecision,
  reviewRequest,
  revisionAnswer,
  revisionListAnswer,
  revisionListQuery,
} from "../revision.ts";
import { workingCopyAnswer } from "../workingCopy.ts";
import type { Route } from "./route.ts";

const id = { description: "Id of the voice" };
const all = { tag: "voices", session: true, parameters: { id } } as const;
const one = { ...all, parameters: { id, number: { description: "Number of the revision" } } } as const;
const path = "/api/voices/{id}/revisions";

export const revisionRoutes: readonly Route[] = [
  {
    ...all,
    method: "GET",
    path,
    operationId: "listRevisions",
    summary: "The revisions of a voice; who reads released ones alone is given no other",
    query: revisionListQuery,
    answers: { 200: { description: "One page of revisions", body: revisionListAnswer } },
    problems: [404, 422],
  },
  {
    ...all,
    method: "POST",
    path,
    operationId: "makeRevision",
    summary: "Keep the working copy as it stands, with all its figures, for good",
    requestHeaders: { "If-Match": { description: "The ETag of the working copy that is meant", required: false } },
    body: newRevision,
    answers: { 201: { description: "The revision", body: revisionAnswer, headers: { Location: "Its address" } } },
    problems: [403, 404, 412],
  },
  {
    ...one,
    method: "GET",
    path: `${path}/{number}`,
    operationId: "readRevision",
    summary: "Inputs, results and warnings as they were kept",
    answers: { 200: { description: "The revision", body: revisionAnswer } },
    problems: [403, 404],
  },
  {
    ...one,
    method: "GET",
    path: `${path}/{number}/recompute`,
    operationId: "recomputeRevision",
    summary: "Which figures this version of the library computes differently",
    answers: { 200: { description: "Differences; none where every figure holds", body: recomputeAnswer } },
    problems: [403, 404],
  },
  {
    ...one,
    method: "POST",
    path: `${path}/{number}/restore`,
    operationId: "restoreRevision",
    summary: "Put what the revision holds into the working copy",
    requestHeaders: { "If-Match": { description: "The ETag of the working copy last read", required: true } },
    answers: {
      200: { description: "The working copy", body: workingCopyAnswer, headers: { ETag: "Names its new state" } },
    },
    problems: [403, 404, 412, 422, 428],
  },
  {
    ...one,
    method: "POST",
    path: `${path}/{number}/review-request`,
    operationId: "askForReview",
    summary: "Put a revision under review, and tell whoever is asked by e-mail",
    body: reviewRequest,
    answers: { 200: { description: "The revision", body: revisionAnswer } },
    problems: [403, 404, 409],
  },
  {
    ...one,
    method: "POST",
    path: `${path}/{number}/review`,
    operationId: "decideReview",
    summary: "Release or return a revision under review, never one's own",
    body: reviewDecision,
    answers: { 200: { description: "The revision", body: revisionAnswer } },
    problems: [403, 404, 409],
  },
  {
    ...all,
    method: "GET",
    path: "/api/voices/{id}/compare",
    operationId: "compareRevisions",
    summary:
      "What changed between two revisions, or the working copy and one, of one voice or of two; as CSV if Accept says so",
    query: compareQuery,
    answers: { 200: { description: "Changes, old and new", body: compareAnswer } },
    problems: [403, 404, 422],
  },
];
