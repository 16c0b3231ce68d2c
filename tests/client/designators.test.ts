import { describe, expect, it } from "vitest";
import { designatorLetters } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { assignDesignators } from "#lib/client/stage/designators.ts";
import { startingState } from "#lib/wire/stageState.ts";

const topology = stageKinds.flatMap((kind) => kind.topologies).find((t) => Object.keys(t.parts).length >= 4)!;
const parts = Object.fromEntries(Object.keys(topology.parts).map((key) => [key, 1000]));

describe("designators of a stage", () => {
  it("carry the letter of their class and are never given twice", () => {
    const given = assignDesignators(topology, parts, {}, []);
    expect(Object.keys(given)).toEqual(Object.keys(topology.parts));
    expect(new Set(Object.values(given)).size).toBe(Object.keys(given).length);
    for (const [key, designator] of Object.entries(given)) {
      expect(designator).toMatch(new RegExp(`^${designatorLetters[topology.parts[key]!.partClass]}[1-9]\\d*$`));
    }
  });

  it("take the next number that is free in the voice", () => {
    const first = assignDesignators(topology, parts, {}, []);
    const second = assignDesignators(topology, parts, {}, Object.values(first));
    expect(Object.values(second).filter((d) => Object.values(first).includes(d))).toEqual([]);
    const gap = Object.values(first)[0]!;
    expect(Object.values(assignDesignators(topology, parts, {}, [...Object.values(first).slice(1)]))).toContain(gap);
  });

  it("stay with the part that has one", () => {
    const [key] = Object.keys(topology.parts);
    const letter = designatorLetters[topology.parts[key!]!.partClass];
    const given = assignDesignators(topology, parts, { [key!]: `${letter}77` }, []);
    expect(given[key!]).toBe(`${letter}77`);
  });

  it("are not spent on a part that is not fitted", () => {
    const start = startingState(topology).parts;
    const [key] = Object.keys(start);
    expect(assignDesignators(topology, { ...start, [key!]: 0 }, {}, [])).not.toHaveProperty(key!);
  });
});
