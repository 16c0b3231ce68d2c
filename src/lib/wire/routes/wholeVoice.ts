import { checkAnswer, checkQuery } from "../check.ts";
import { partsListAnswer, partsListQuery } from "../partsList.ts";
import type { Route } from "./route.ts";

const common = { tag: "voices", session: true, parameters: { id: { description: "Id of the voice" } } } as const;

/** What is said of a voice as a whole. */
export const wholeVoiceRoutes: readonly Route[] = [
  {
    ...common,
    method: "POST",
    path: "/api/voices/{id}/check",
    operationId: "checkVoice",
    summary: "Levels, supply and everything that is not right, over the whole voice",
    query: checkQuery,
    answers: { 200: { description: "What was found", body: checkAnswer } },
    problems: [403, 404, 422],
  },
  {
    ...common,
    method: "GET",
    path: "/api/voices/{id}/parts-list",
    operationId: "readPartsList",
    summary: "Every part with value, tolerance, type, stage and quantity; as CSV if Accept says so",
    query: partsListQuery,
    answers: { 200: { description: "The parts", body: partsListAnswer } },
    problems: [403, 404, 422],
  },
];
