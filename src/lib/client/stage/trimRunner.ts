import type {
  Revaluation,
  RevalueWish,
  TrimCoverage,
  TrimFigures,
  TrimRequest,
} from "#lib/circuit/analysis/trim/index.ts";
import type { TrimAsk, TrimReply } from "../../../workers/trim.ts";

export interface TrimRunner {
  /** A newer question ends an older one. */
  run(kind: string, topology: string, request: TrimRequest): void;
  revalue(kind: string, topology: string, request: TrimRequest, wish: RevalueWish): void;
  end(): void;
}

interface Listener {
  figures(figures: TrimFigures): void;
  coverage(coverage: TrimCoverage): void;
  revaluation(revaluation: Revaluation): void;
  /** The browser cannot run it. */
  failed(): void;
}

/** Turns knobs beside the page. */
export function startTrimRunner(listener: Listener): TrimRunner {
  let worker: Worker | undefined;
  let latest = 0;
  const begin = () => {
    const started = new Worker(new URL("../../../workers/trim.ts", import.meta.url), { type: "module" });
    started.addEventListener("message", ({ data }: MessageEvent<TrimReply>) => {
      if (data.id !== latest) return;
      if ("figures" in data) listener.figures(data.figures);
      else if ("coverage" in data) listener.coverage(data.coverage);
      else if ("revaluation" in data) listener.revaluation(data.revaluation);
      else listener.failed();
    });
    started.addEventListener("error", () => listener.failed());
    return started;
  };
  const tell = (ask: TrimAsk) => {
    worker ??= begin();
    worker.postMessage(ask);
  };
  return {
    run: (kind, topology, request) => tell({ ask: "run", id: ++latest, kind, topology, request }),
    revalue: (kind, topology, request, wish) => tell({ ask: "revalue", id: ++latest, kind, topology, request, wish }),
    end() {
      worker?.terminate();
      worker = undefined;
    },
  };
}
