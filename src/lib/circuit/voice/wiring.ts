import type { Chain, ChainLink, LinkEnd } from "./chain.ts";

/** The links of a voice, found from either end. */
export interface Wiring {
  /** The output that feeds an input. */
  sourceOf(stage: string, port: string): LinkEnd | undefined;
  /** The inputs that an output feeds. */
  fedBy(stage: string, port: string): readonly LinkEnd[];
  /** All that is linked to a stage, for comparing one voice with another. */
  of(stage: string): readonly (readonly [string, string, string])[];
}

const keyOf = (stage: string, port: string) => JSON.stringify([stage, port]);

export function wiringOf({ links }: Pick<Chain, "links">): Wiring {
  const sources = new Map<string, LinkEnd>();
  const fed = new Map<string, LinkEnd[]>();
  const ofStage = new Map<string, (readonly [string, string, string])[]>();
  const note = (own: LinkEnd, other: LinkEnd) => {
    const list = ofStage.get(own.stage) ?? [];
    list.push([own.port, other.stage, other.port]);
    ofStage.set(own.stage, list);
  };
  for (const { from, to } of links as readonly ChainLink[]) {
    sources.set(keyOf(to.stage, to.port), from);
    const key = keyOf(from.stage, from.port);
    fed.set(key, [...(fed.get(key) ?? []), to]);
    note(from, to);
    note(to, from);
  }
  return {
    sourceOf: (stage, port) => sources.get(keyOf(stage, port)),
    fedBy: (stage, port) => fed.get(keyOf(stage, port)) ?? [],
    of: (stage) => ofStage.get(stage) ?? [],
  };
}
