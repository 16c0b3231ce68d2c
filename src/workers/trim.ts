import {
  runRevalue,
  trimCoverage,
  trimFigures,
  type Revaluation,
  type RevalueWish,
  type TrimCoverage,
  type TrimFigures,
  type TrimRequest,
} from "#lib/circuit/analysis/trim/index.ts";
import { loadTopology } from "#lib/circuit/kinds/load.ts";
import { inSlices } from "./slices.ts";

export type TrimAsk =
  | { ask: "run"; id: number; kind: string; topology: string; request: TrimRequest }
  | { ask: "revalue"; id: number; kind: string; topology: string; request: TrimRequest; wish: RevalueWish };

export type TrimReply =
  | { id: number; figures: TrimFigures }
  | { id: number; coverage: TrimCoverage }
  | { id: number; revaluation: Revaluation }
  | { id: number; failed: true };

const betweenReports = 150;

let latest = 0;
const send = (reply: TrimReply) => self.postMessage(reply);

self.addEventListener("message", ({ data }: MessageEvent<TrimAsk>) => {
  latest = data.id;
  void answer(data).catch(() => send({ id: data.id, failed: true }));
});

async function answer(task: TrimAsk) {
  const { id } = task;
  const wanted = () => latest === id;
  const topology = await loadTopology(task.kind, task.topology);
  if (task.ask === "revalue") {
    const revaluation = await inSlices(runRevalue(topology, task.request, task.wish), wanted);
    if (revaluation) send({ id, revaluation });
    return;
  }
  const figures = await inSlices(trimFigures(topology, task.request), wanted);
  if (!figures) return;
  send({ id, figures });
  let reported = performance.now();
  const coverage = await inSlices(trimCoverage(topology, task.request), wanted, (sofar) => {
    if (performance.now() - reported < betweenReports) return;
    reported = performance.now();
    send({ id, coverage: sofar });
  });
  if (coverage) send({ id, coverage });
}
