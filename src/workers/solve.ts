import { solveStage, type SolveRequest } from "#lib/circuit/index.ts";
import { loadTopology } from "#lib/circuit/kinds/load.ts";

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
  void answer(data).then((reply) => self.postMessage(reply));
});

async function answer({ id, kind, topology, request }: SolveTask): Promise<SolveReply> {
  try {
    return { id, outcome: solveStage(await loadTopology(kind, topology), request) };
  } catch {
    return { id, outcome: null };
  }
}
