import type { Remedy, SpreadLook, SpreadRequest, SpreadView } from "#lib/circuit/analysis/spread/index.ts";
import type { SpreadAsk, SpreadReply } from "../../../workers/spread.ts";

export interface SpreadRunner {
  /** Draws boards anew; an older question's answers are worthless from then on. */
  run(kind: string, topology: string, request: SpreadRequest, look: SpreadLook): void;
  look(look: SpreadLook): void;
  /** Keeps the boards drawn so far. */
  stop(): void;
  remedy(wanted: number): void;
  end(): void;
}

interface Listener {
  view(view: SpreadView, ended: boolean): void;
  remedy(remedy: Remedy): void;
  /** The browser cannot run it. */
  failed(): void;
}

/** Draws boards beside the page. */
export function startSpreadRunner(listener: Listener): SpreadRunner {
  let worker: Worker | undefined;
  let latest = 0;
  const begin = () => {
    const started = new Worker(new URL("../../../workers/spread.ts", import.meta.url), { type: "module" });
    started.addEventListener("message", ({ data }: MessageEvent<SpreadReply>) => {
      if (data.id !== latest) return;
      if ("failed" in data) listener.failed();
      else if ("remedy" in data) listener.remedy(data.remedy);
      else listener.view(data.view, data.ended);
    });
    started.addEventListener("error", () => listener.failed());
    return started;
  };
  const tell = (ask: SpreadAsk) => worker?.postMessage(ask);
  return {
    run(kind, topology, request, look) {
      worker ??= begin();
      latest += 1;
      tell({ ask: "run", id: latest, kind, topology, request, look });
    },
    look: (look) => tell({ ask: "look", look }),
    stop: () => tell({ ask: "stop" }),
    remedy: (wanted) => tell({ ask: "remedy", wanted }),
    end() {
      worker?.terminate();
      worker = undefined;
    },
  };
}
