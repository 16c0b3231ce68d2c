import type { AnyTopology } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { z } from "zod";
import { analyseAnswer, curvesAnswer, kindsAnswer, solveAnswer, topologySchemas } from "../calculator.ts";
import { spreadAnswer, spreadSchema } from "../spread.ts";
import { trimAnswer, trimSchema } from "../trim.ts";
import { kindAnswer } from "../kindDescription.ts";
import type { Route } from "./route.ts";

const common = { tag: "calculators", session: false } as const;

const kind = { description: "A stage kind", values: stageKinds.map(({ id }) => id) };
const topology = {
  description: "The network that realises it",
  values: [...new Set(stageKinds.flatMap(({ topologies }) => topologies.map(({ id }) => id)))],
};

/** What may be sent: one schema for each topology there is, under its own name. */
function bodyOf(schemaOf: (network: AnyTopology) => z.ZodType): z.ZodType {
  const each = stageKinds.flatMap(({ id, topologies }) =>
    topologies.map((network) => schemaOf(network).meta({ title: `${id} / ${network.id}` })),
  );
  return z.union(each);
}

const calculation = {
  ...common,
  method: "POST",
  parameters: { kind, topology },
  problems: [404, 429],
} as const;

export const calculatorRoutes: readonly Route[] = [
  {
    ...common,
    method: "GET",
    path: "/api/kinds",
    operationId: "listKinds",
    summary: "Every stage kind",
    answers: { 200: { description: "In the order a voice is built", body: kindsAnswer } },
  },
  {
    ...common,
    method: "GET",
    path: "/api/kinds/{kind}",
    operationId: "readKind",
    summary: "What a stage kind takes and gives",
    parameters: { kind },
    answers: { 200: { description: "Its topologies, with the schema of every value", body: kindAnswer } },
    problems: [404],
  },
  {
    ...calculation,
    path: "/api/kinds/{kind}/{topology}/analyse",
    operationId: "analyseStage",
    summary: "Results and warnings of given parts",
    body: bodyOf((network) => topologySchemas(network).analyse),
    answers: { 200: { description: "Results, warnings and the state of each target", body: analyseAnswer } },
  },
  {
    ...calculation,
    path: "/api/kinds/{kind}/{topology}/solve",
    operationId: "solveStage",
    summary: "Parts that meet the targets",
    body: bodyOf((network) => topologySchemas(network).solve),
    answers: { 200: { description: "Exact parts, and choices of values that exist", body: solveAnswer } },
  },
  {
    ...calculation,
    path: "/api/kinds/{kind}/{topology}/curves",
    operationId: "plotStage",
    summary: "Curves of given parts",
    body: bodyOf((network) => topologySchemas(network).curves),
    answers: { 200: { description: "Points of each curve", body: curvesAnswer } },
  },
  {
    ...calculation,
    path: "/api/kinds/{kind}/{topology}/spread",
    operationId: "spreadStage",
    summary: "Spread of the results over tolerances and temperature, and the yield",
    body: bodyOf(spreadSchema),
    answers: {
      200: { description: "Corners, first order, random boards, and the band of a curve", body: spreadAnswer },
    },
    problems: [404, 429, 503],
  },
  {
    ...calculation,
    path: "/api/kinds/{kind}/{topology}/trim",
    operationId: "trimStage",
    summary: "What a pot reaches, on how many boards, and values that would serve better",
    body: bodyOf(trimSchema),
    answers: { 200: { description: "Travel, ends, worst case, coverage over random boards", body: trimAnswer } },
    problems: [404, 429, 503],
  },
];
