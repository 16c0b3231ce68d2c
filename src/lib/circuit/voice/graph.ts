import { portsOf, type ChainLink, type ChainStage, type FindTopology, type LinkEnd } from "./chain.ts";

export interface LinkFault {
  /** Which of the links, and where in it. */
  index: number;
  at: readonly string[];
  message: string;
}

type Named = Pick<ChainStage, "id" | "name" | "kind" | "topology">;

/** Why links cannot stand: no such stage or port, the wrong way round, another sort, an input fed twice, a circle. */
export function linkFaults(stages: readonly Named[], links: readonly ChainLink[], find: FindTopology): LinkFault[] {
  const known = new Map(stages.map((stage) => [stage.id, stage]));
  const feeds = new Map<string, Set<string>>();
  const fed = new Map<string, number>();
  const faults: LinkFault[] = [];
  links.forEach((link, index): void => {
    const report = (at: string[], message: string) => faults.push({ index, at, message });
    const before = faults.length;
    const from = portAt(link.from, "out", known, find, (at, message) => report(["from", at], message));
    const to = portAt(link.to, "in", known, find, (at, message) => report(["to", at], message));
    if (faults.length > before) return;
    if (from && to && from.sort !== to.sort) {
      report(["to", "port"], `A link joins ports of one sort: ${from.words}, but ${to.words}.`);
      return;
    }
    const input = JSON.stringify([link.to.stage, link.to.port]);
    const taken = fed.get(input);
    if (taken !== undefined) {
      const text = `This input is fed by link ${taken + 1} already. Take that away first, or add the two in a stage of their own.`;
      report(["to", "port"], text);
      return;
    }
    fed.set(input, index);
    const way = pathBetween(link.to.stage, link.from.stage, feeds);
    if (way) {
      const names = [...way, link.to.stage].map((id) => known.get(id)!.name);
      report([], `This link closes a circle: ${names.join(" → ")}. Nothing may feed itself.`);
      return;
    }
    feeds.set(link.from.stage, (feeds.get(link.from.stage) ?? new Set()).add(link.to.stage));
  });
  return faults;
}

/** The port at one end, as far as its kind is known; a stage this version does not know keeps its links. */
function portAt(
  { stage: id, port: portId }: LinkEnd,
  direction: "in" | "out",
  known: ReadonlyMap<string, Named>,
  find: FindTopology,
  report: (at: "stage" | "port", message: string) => void,
) {
  const stage = known.get(id);
  if (!stage) return report("stage", `There is no stage ${id} in this voice.`);
  const found = find(stage.kind, stage.topology);
  if (!found) return undefined;
  const ports = portsOf(found);
  const port = ports.find((one) => one.id === portId);
  if (!port) {
    const names = ports.filter((one) => one.direction === direction).map((one) => one.id);
    const offer = names.length > 0 ? `It has: ${names.join(", ")}.` : `It has no ${word[direction]}.`;
    return report("port", `${stage.name} has no port ${portId} in this network. ${offer}`);
  }
  if (port.direction !== direction) {
    return report("port", `${port.label} of ${stage.name} is an ${word[port.direction]}, not an ${word[direction]}.`);
  }
  return { sort: port.sort, words: `${port.label} of ${stage.name} carries ${sortWords[port.sort]}` };
}

const word = { in: "input", out: "output" } as const;

export const sortWords = {
  trigger: "a trigger",
  audio: "sound",
  control: "a control voltage",
  bias: "a bias current",
} as const;

/** The stages from one to another along the links, both included; undefined where no way leads there. */
function pathBetween(start: string, end: string, feeds: ReadonlyMap<string, ReadonlySet<string>>) {
  const cameFrom = new Map<string, string | undefined>([[start, undefined]]);
  const waiting = [start];
  for (let stage = waiting.pop(); stage !== undefined; stage = waiting.pop()) {
    if (stage === end) {
      const way: string[] = [];
      for (let step: string | undefined = stage; step !== undefined; step = cameFrom.get(step)) way.unshift(step);
      return way;
    }
    for (const next of feeds.get(stage) ?? []) {
      if (cameFrom.has(next)) continue;
      cameFrom.set(next, stage);
      waiting.push(next);
    }
  }
  return undefined;
}

/** Every stage after all that feed it; those that nothing orders keep the order of the voice. Links must be free of circles. */
export function signalOrder(stages: readonly { id: string }[], links: readonly ChainLink[]): string[] {
  const waitsFor = new Map(stages.map(({ id }) => [id, 0]));
  const feeds = new Map<string, string[]>();
  for (const { from, to } of links) {
    if (!waitsFor.has(from.stage) || !waitsFor.has(to.stage)) continue;
    waitsFor.set(to.stage, waitsFor.get(to.stage)! + 1);
    feeds.set(from.stage, [...(feeds.get(from.stage) ?? []), to.stage]);
  }
  const ready = stages.filter(({ id }) => waitsFor.get(id) === 0).map(({ id }) => id);
  const order: string[] = [];
  for (let index = 0; index < ready.length; index += 1) {
    const id = ready[index]!;
    order.push(id);
    for (const next of feeds.get(id) ?? []) {
      waitsFor.set(next, waitsFor.get(next)! - 1);
      if (waitsFor.get(next) === 0) ready.push(next);
    }
  }
  if (order.length < stages.length) throw new Error("signalOrder: the links close a circle");
  return order;
}
