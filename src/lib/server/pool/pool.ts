import { Worker } from "node:worker_threads";
import { Refusal } from "../errors.ts";

export interface PoolLimits {
  /** Threads at most. */
  workers: number;
  /** Tasks that may wait for one. */
  queue: number;
  /** How long one may take. */
  seconds: number;
  /** Heap of a thread, MiB. */
  memory: number;
}

export interface Pool {
  /** Runs a task on a thread of its own; ending the signal takes it off, wherever it stands. */
  run(task: unknown, signal?: AbortSignal): Promise<unknown>;
  close(): Promise<void>;
}

interface Job {
  task: unknown;
  settle(outcome: { answer: unknown } | { refusal: Error }): void;
}

type Reply = { answer: unknown } | { failed: string };

const busy = (detail: string, wait: number) =>
  new Refusal("busy", detail, { headers: { "retry-after": String(wait) } });

/**
 * Threads for calculations that would hold up every other request. A task that is cancelled or takes too long ends with
 * its thread: no calculation need listen, and nothing it holds stays behind.
 *
 * @param file what a thread runs: it answers each message with one
 */
export function createPool(file: string, limits: PoolLimits): Pool {
  const idle: Worker[] = [];
  const working = new Map<Worker, Job>();
  const waiting: Job[] = [];

  const next = () => {
    const job = waiting.shift();
    if (job) start(job);
  };

  const finish = (worker: Worker, outcome: Parameters<Job["settle"]>[0], keep: boolean) => {
    const job = working.get(worker);
    if (!job) return;
    working.delete(worker);
    if (keep) idle.push(worker);
    else void worker.terminate();
    job.settle(outcome);
    next();
  };

  const open = (): Worker => {
    const worker = new Worker(file, { resourceLimits: { maxOldGenerationSizeMb: limits.memory } });
    // A thread that waits for work must not keep the server from stopping.
    worker.unref();
    worker.on("message", (reply: Reply) =>
      finish(worker, "answer" in reply ? reply : { refusal: new Error(reply.failed) }, true),
    );
    worker.on("error", (error: Error & { code?: string }) => {
      const idleAt = idle.indexOf(worker);
      if (idleAt >= 0) idle.splice(idleAt, 1);
      const refusal =
        error.code === "ERR_WORKER_OUT_OF_MEMORY"
          ? busy("The calculation needed more memory than one may take, and was stopped. Ask for fewer boards.", 1)
          : error;
      finish(worker, { refusal }, false);
    });
    return worker;
  };

  const start = (job: Job) => {
    const worker = idle.pop() ?? open();
    working.set(worker, job);
    worker.postMessage(job.task);
    const late = setTimeout(() => {
      if (working.get(worker) !== job) return;
      const detail = `The calculation took longer than ${limits.seconds} s and was stopped. Ask for fewer boards, or try again when less is being calculated.`;
      finish(worker, { refusal: busy(detail, limits.seconds) }, false);
    }, limits.seconds * 1000);
    const { settle } = job;
    job.settle = (outcome) => {
      clearTimeout(late);
      settle(outcome);
    };
  };

  const cancel = (job: Job, reason: Error) => {
    const place = waiting.indexOf(job);
    if (place >= 0) {
      waiting.splice(place, 1);
      job.settle({ refusal: reason });
      return;
    }
    const [worker] = [...working].find(([, at]) => at === job) ?? [];
    if (worker) finish(worker, { refusal: reason }, false);
  };

  return {
    run(task, signal) {
      if (working.size >= limits.workers && waiting.length >= limits.queue) {
        const detail = `${limits.queue + limits.workers} calculations are under way or waiting, and no more fit. Nothing was calculated; try again in a moment.`;
        return Promise.reject(busy(detail, 2));
      }
      return new Promise((resolve, reject) => {
        const job: Job = {
          task,
          settle(outcome) {
            signal?.removeEventListener("abort", abort);
            if ("answer" in outcome) resolve(outcome.answer);
            else reject(outcome.refusal);
          },
        };
        const abort = () => cancel(job, busy("Whoever asked went away, and the calculation was stopped.", 1));
        signal?.addEventListener("abort", abort, { once: true });
        if (working.size < limits.workers) start(job);
        else waiting.push(job);
        if (signal?.aborted) abort();
      });
    },
    async close() {
      for (const job of waiting.splice(0)) job.settle({ refusal: busy("The server is stopping.", 5) });
      await Promise.all([...idle.splice(0), ...working.keys()].map((worker) => worker.terminate()));
    },
  };
}
