import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";

export const GET = answer(() =>
  json({
    kinds: stageKinds.map(({ id, name, summary, topologies }) => ({
      slug: id,
      name,
      summary,
      topologies: topologies.map((t) => t.id),
    })),
  }),
);

export const ALL = methodNotAllowed("GET");
