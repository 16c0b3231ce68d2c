import type { SolveRequest } from "#lib/circuit/index.ts";
import type { SolveReply, SolveTask } from "../../../workers/solve.ts";

export type SolveOutcome = NonNullable<SolveReply["outcome"]>;

export interface Solver {
  /** Asks for candidates; a newer question makes an older one's answer worthless. */
  ask(kind: string, topology: string, request: SolveRequest): void;
  stop(): void;
}

/** Works out parts beside the page. `failed` is told where the browser cannot run the worker. */
export function startSolver(answered: (outcome: SolveOutcome) => void, failed: () => void): Solver {
  let worker: Worker | undefined;
  let latest = 0;
  let busy = false;
  const begin = () => {
    const started = new Worker(new URL("../../../workers/solve.ts", import.meta.url), { type: "module" });
    started.addEventListener("message", ({ data }: MessageEvent<SolveReply>) => {
      if (data.id !== latest) return;
      busy = false;
      if (data.outcome === null) failed();
      else answered(data.outcome);
    });
    started.addEventListener("error", () => {
      busy = false;
      failed();
    });
    return started;
  };
  return {
    ask(kind, topology, request) {
      // A search under way cannot be told to stop, only ended; the next one need not wait for it.
      if (busy) {
        worker?.terminate();
        worker = undefined;
      }
      busy = true;
      latest += 1;
      worker ??= begin();
      const task: SolveTask = { id: latest, kind, topology, request };
      worker.postMessage(task);
    },
    stop() {
      worker?.terminate();
      worker = undefined;
    },
  };
}
