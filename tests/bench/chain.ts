import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { voiceTemplates } from "#lib/circuit/kinds/templates.ts";
import { computeChain, findIn, type Chain } from "#lib/circuit/voice/index.ts";
import { beginStages } from "#lib/circuit/voice/template.ts";

const find = findIn(stageKinds);
const template = voiceTemplates[0];

/** The largest template over and over, as one voice of so many stages. */
function voiceOf(count: number): Chain {
  const begun = beginStages(template, stageKinds);
  const rounds = Array.from({ length: Math.ceil(count / begun.length) }, (_, round) => round);
  const stages = rounds.flatMap((round) => begun.map((stage) => ({ ...stage, id: `${stage.id}-${round}` })));
  const kept = stages.slice(0, count);
  const known = new Set(kept.map(({ id }) => id));
  const links = rounds.flatMap((round) =>
    template.links.map(({ id, from, to }) => ({
      id: `${id}-${round}`,
      from: { ...from, stage: `${from.stage}-${round}` },
      to: { ...to, stage: `${to.stage}-${round}` },
    })),
  );
  return {
    stages: kept,
    links: links.filter((link) => known.has(link.from.stage) && known.has(link.to.stage)),
    conditions: {},
  };
}

/** One part of one stage, another value each time. */
function changed(chain: Chain, turn: number): Chain {
  const [first, ...rest] = chain.stages;
  const [part, value] = Object.entries(first!.parts).find(([, size]) => size > 0)!;
  return { ...chain, stages: [{ ...first!, parts: { ...first!.parts, [part]: value * (1 + turn * 1e-6) } }, ...rest] };
}

/** Median ms of a whole recomputation, and of one after a change at the very front, which most depends on. */
export function chainTimes(count: number): { whole: number; change: number } {
  const chain = voiceOf(count);
  const median = (job: (turn: number) => void) => {
    const times = Array.from({ length: 15 }, (_, turn) => {
      const start = performance.now();
      job(turn + 1);
      return performance.now() - start;
    });
    return times.sort((a, b) => a - b)[7]!;
  };
  let computed = computeChain(chain, find);
  return {
    whole: median(() => void computeChain(chain, find)),
    change: median((turn) => void (computed = computeChain(changed(chain, turn), find, computed))),
  };
}
