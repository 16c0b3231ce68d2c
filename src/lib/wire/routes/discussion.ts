import { activityAnswer, activityQuery } from "../activity.ts";
import { commentAnswer, commentChange, commentListAnswer, commentListQuery, newComment } from "../comment.ts";
import { mailChoice } from "../mailChoice.ts";
import { newShareLink, newShareLinkAnswer, shareLinkListAnswer, shareLinkListQuery } from "../shareLink.ts";
import type { Route } from "./route.ts";

const id = { description: "Id of the voice" };
const voice = { tag: "voices", session: true, parameters: { id } } as const;
const comment = { ...voice, parameters: { id, commentId: { description: "Id of the remark" } } } as const;

export const discussionRoutes: readonly Route[] = [
  {
    ...voice,
    method: "GET",
    path: "/api/voices/{id}/comments",
    operationId: "listComments",
    summary: "Remarks on a voice, or on one of its revisions",
    query: commentListQuery,
    answers: { 200: { description: "One page of remarks", body: commentListAnswer } },
    problems: [403, 404, 422],
  },
  {
    ...voice,
    method: "POST",
    path: "/api/voices/{id}/comments",
    operationId: "writeComment",
    summary: "Write on a revision, or answer; whoever is mentioned gets an e-mail",
    body: newComment,
    answers: { 201: { description: "The remark", body: commentAnswer, headers: { Location: "Its address" } } },
    problems: [403, 404],
  },
  {
    ...comment,
    method: "PATCH",
    path: "/api/voices/{id}/comments/{commentId}",
    operationId: "changeComment",
    summary: "Rewrite a remark of your own, or resolve a thread",
    body: commentChange,
    answers: { 200: { description: "The remark", body: commentAnswer } },
    problems: [403, 404, 409],
  },
  {
    ...comment,
    method: "DELETE",
    path: "/api/voices/{id}/comments/{commentId}",
    operationId: "deleteComment",
    summary: "Take back a remark of your own; that there was one stays",
    answers: { 204: { description: "It is empty now" } },
    problems: [403, 404],
  },
  {
    ...voice,
    method: "GET",
    path: "/api/voices/{id}/share-links",
    operationId: "listShareLinks",
    summary: "Guest links to revisions of a voice",
    query: shareLinkListQuery,
    answers: { 200: { description: "One page of links that are not revoked", body: shareLinkListAnswer } },
    problems: [403, 404, 422],
  },
  {
    ...voice,
    method: "POST",
    path: "/api/voices/{id}/share-links",
    operationId: "makeShareLink",
    summary: "Make an address that opens a released revision without an account, as a page or as JSON",
    body: newShareLink,
    answers: { 201: { description: "The link, its address shown this once", body: newShareLinkAnswer } },
    problems: [403, 404, 409],
  },
  {
    ...voice,
    method: "DELETE",
    path: "/api/voices/{id}/share-links/{linkId}",
    operationId: "revokeShareLink",
    summary: "Close a guest link for good",
    parameters: { id, linkId: { description: "Id of the link" } },
    answers: { 204: { description: "It opens nothing any more" } },
    problems: [403, 404],
  },
  {
    tag: "team",
    session: true,
    method: "GET",
    path: "/api/team/activity",
    operationId: "listActivity",
    summary: "Who did what when; as CSV if Accept says so",
    query: activityQuery,
    answers: { 200: { description: "One page of the log", body: activityAnswer } },
    problems: [403, 422],
  },
  {
    tag: "account",
    session: true,
    method: "GET",
    path: "/api/account/mail",
    operationId: "readMailChoice",
    summary: "Which mails you get",
    answers: { 200: { description: "Your choice", body: mailChoice } },
  },
  {
    tag: "account",
    session: true,
    method: "PUT",
    path: "/api/account/mail",
    operationId: "chooseMail",
    summary: "Choose which mails you get",
    body: mailChoice,
    answers: { 200: { description: "Your choice", body: mailChoice } },
  },
];
