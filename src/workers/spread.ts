import {
  runRemedy,
  runSpread,
  viewSpread,
  type Remedy,
  type SpreadLook,
  type SpreadRequest,
  type SpreadRun,
  type SpreadView,
} from "#lib/circuit/analysis/spread/index.ts";
import { loadTopology } from "#lib/circuit/kinds/load.ts";
import { inSlices } from "./slices.ts";

export type SpreadAsk =
  | { ask: "run"; id: number; kind: string; topology: string; request: SpreadRequest; look: SpreadLook }
  /** Another result of the same boards. */
  | { ask: "look"; look: SpreadLook }
  | { ask: "stop" }
  | { ask: "remedy"; wanted: number };

export type SpreadReply =
  { id: number; view: SpreadView; ended: boolean } | { id: number; remedy: Remedy } | { id: number; failed: true };

const betweenReports = 150;

interface Job {
  id: number;
  topology: Parameters<typeof runSpread>[0];
  look: SpreadLook;
  run?: SpreadRun;
  ended: boolean;
}

/** A newer question takes the place of an older one, whose slices then come to an end. */
let job: Job | undefined;

const send = (reply: SpreadReply) => self.postMessage(reply);
self.addEventListener("message", ({ data }: MessageEvent<SpreadAsk>) => {
  if (data.ask === "run") void drawBoards(data);
  else if (data.ask === "remedy") void findRemedy(data.wanted);
  else if (job) {
    // Stopped, what has been drawn stays as a smaller number of boards.
    if (data.ask === "stop") job.ended = true;
    else job.look = data.look;
    report(job);
  }
});

function report({ id, run, look, ended }: Job) {
  if (run) send({ id, view: viewSpread(run, look), ended });
}

async function drawBoards({ id, kind, topology, request, look }: Extract<SpreadAsk, { ask: "run" }>) {
  try {
    const own: Job = { id, topology: await loadTopology(kind, topology), look, ended: false };
    if (job && job.id > id) return;
    job = own;
    let reported = -Infinity;
    const finished = await inSlices(
      runSpread(own.topology, request),
      () => job === own && !own.ended,
      (run) => {
        own.run = run;
        if (performance.now() - reported < betweenReports) return;
        report(own);
        reported = performance.now();
      },
    );
    if (!finished) return;
    own.run = finished;
    own.ended = true;
    report(own);
  } catch {
    send({ id, failed: true });
  }
}

async function findRemedy(wanted: number) {
  const own = job;
  if (!own?.run) return;
  const { request, nominal, slopes } = own.run;
  try {
    const remedy = await inSlices(runRemedy(own.topology, request, wanted, nominal, slopes), () => job === own);
    if (remedy) send({ id: own.id, remedy });
  } catch {
    send({ id: own.id, failed: true });
  }
}
