import { solveStage, type SolveRequest } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";

export interface SolveTask {
  id: number;
  kind: string;
  topology: string;
  request: SolveRequest;
}

export interface SolveReply {
  id: number;
  outcome: ReturnType<typeof solveStage> | null;
}

// Some hundred exact analyses take longer than a frame, so they are done here, beside the page.
self.addEventListener("message", ({ data }: MessageEvent<SolveTask>) => {
  const topology = stageKinds.find(({ id }) => id === data.kind)?.topologies.find(({ id }) => id === data.topology);
  const reply: SolveReply = { id: data.id, outcome: topology ? solveStage(topology, data.request) : null };
  self.postMessage(reply);
});
