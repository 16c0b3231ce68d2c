/** `npm run bench`: what the calculations cost, in the library and over HTTP. All ratios come from one run. */
import { bandPass } from "#lib/circuit/kinds/band-pass/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { chainTimes } from "./chain.ts";
import { analysisCosts, rate, subject, work } from "./library.ts";
import { benchLists } from "./lists.ts";
import { send } from "./load.ts";
import { startServer, type BenchServer } from "./server.ts";

const aims = { analyseToIdle: 0.8, memoryGrowth: 1.3, secondsPerAnalysis: 5e-3 };
const rounds = 9;
const perRound = 1000;
const connections = 16;

const round = (value: number) => value.toLocaleString("en-GB", { maximumFractionDigits: value < 100 ? 2 : 0 });
const median = (values: number[]) => values.sort((a, b) => a - b)[Math.floor(values.length / 2)]!;
const line = (name: string, value: string) => console.log(`${name.padEnd(44)} ${value}`);

function benchLibrary(): void {
  const rates = Object.fromEntries(
    Object.entries(work).map(([name, job]) => [name, rate(job, name.endsWith("mathjs") ? 2 : 3)]),
  );
  for (const [name, perSecond] of Object.entries(rates)) line(name, `${round(perSecond)} /s`);
  for (const name of ["analyse", "400-point curve"])
    line(`${name}, library to mathjs`, `${round(rates[name]! / rates[`${name} through mathjs`]!)} times`);
}

/** Every topology of every kind. */
function benchKinds(): boolean {
  let dearest = { name: "", seconds: 0 };
  for (const cost of analysisCosts(stageKinds)) {
    line(`analyse ${cost.name}`, `${round(1 / cost.seconds)} /s`);
    if (cost.seconds > dearest.seconds) dearest = cost;
  }
  const milliseconds = (seconds: number) => `${round(seconds * 1000)} ms`;
  line(
    "dearest analysis",
    `${milliseconds(dearest.seconds)}, ${dearest.name} (aim: at most ${milliseconds(aims.secondsPerAnalysis)})`,
  );
  return dearest.seconds <= aims.secondsPerAnalysis;
}

function benchChain(): void {
  for (const stages of [14, 60]) {
    const { whole, change } = chainTimes(stages);
    line(`voice of ${stages} stages, whole`, `${round(whole)} ms`);
    line(`voice of ${stages} stages, one value changed`, `${round(change)} ms`);
  }
}

async function benchServer(server: BenchServer): Promise<boolean> {
  const { host, port } = server;
  const topology = bandPass.topologies[0]!.id;
  const paths = { analyse: `/api/kinds/${bandPass.id}/${topology}/analyse`, idle: "/api/idle" };
  const body = JSON.stringify(subject);
  const load = (path: string, requests: number) => send({ host, port, path, body, connections, requests });
  let analyses = 0;
  const analyse = (requests: number) => ((analyses += requests), load(paths.analyse, requests));

  await analyse(1000);
  await load(paths.idle, 1000);
  await analyse(1000);
  const early = server.memory();

  // Turn and turn about, so that whatever else the machine does meets both alike.
  const rates: Record<"analyse" | "idle", number[]> = { analyse: [], idle: [] };
  const cost = { analyse: 0, idle: 0 };
  for (let i = 0; i < rounds; i++)
    for (const name of ["idle", "analyse"] as const) {
      const before = server.processorTime() ?? 0;
      const seconds = name === "analyse" ? await analyse(perRound) : await load(paths.idle, perRound);
      rates[name].push(perRound / seconds);
      cost[name] += (server.processorTime() ?? 0) - before;
    }
  await analyse(20_000 - analyses);
  const late = server.memory();

  const ratio = median(rates.analyse.map((perSecond, i) => perSecond / rates.idle[i]!));
  line("POST to the do-nothing endpoint", `${round(median([...rates.idle]))} /s`);
  line("POST analyse", `${round(median([...rates.analyse]))} /s`);
  line("analyse to do-nothing", `${ratio.toFixed(2)} (aim: at least ${aims.analyseToIdle})`);
  if (cost.idle > 0) {
    const each = (seconds: number) => `${round((seconds * 1e6) / (rounds * perRound))} µs`;
    line("server processor time for each", `do-nothing ${each(cost.idle)}, analyse ${each(cost.analyse)}`);
  }
  const megabytes = (bytes: number) => `${round(bytes / 2 ** 20)} MiB`;
  line("server memory after 2,000 analyses", megabytes(early));
  line(`server memory after ${analyses.toLocaleString("en-GB")}`, megabytes(late));
  line("memory growth", `${(late / early).toFixed(2)} (aim: at most ${aims.memoryGrowth})`);
  return ratio >= aims.analyseToIdle && late / early <= aims.memoryGrowth;
}

// `npm run bench -- lists` measures the lists alone.
if (!process.argv.includes("lists")) {
  benchLibrary();
  benchChain();
  if (!benchKinds()) process.exitCode = 1;
  const server = await startServer();
  try {
    if (!(await benchServer(server))) process.exitCode = 1;
  } finally {
    await server.stop();
  }
}
if (!(await benchLists())) process.exitCode = 1;
