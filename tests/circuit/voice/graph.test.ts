import { linkFaults, signalOrder } from "#lib/circuit/voice/index.ts";
import { describe, expect, test } from "vitest";
import { find, linksOf, stageOf, twoPaths } from "../../support/chains.ts";

const stages = [
  stageOf("a", "band-pass", "multiple-feedback"),
  stageOf("b", "band-pass", "passive"),
  stageOf("c", "band-pass", "bridged-t"),
  stageOf("sum", "summing-node", "inverting"),
  stageOf("trigger", "trigger-input", "comparator"),
  stageOf("cell", "ota-cell", "transimpedance"),
];
const faultsOf = (...links: string[]) =>
  linkFaults(stages, linksOf(...links), find).map(({ index, at, message }) => [[index, ...at].join("."), message]);

describe("links", () => {
  test("of one sort, output to input, without a circle, stand", () => {
    expect(faultsOf("a.out > b.in", "a.out > sum.in1", "b.out > sum.in2", "trigger.out > c.strike")).toEqual([]);
    const { stages: all, links } = twoPaths();
    expect(linkFaults(all, links, find)).toEqual([]);
  });

  test.each([
    [["z.out > a.in"], "0.from.stage", "There is no stage z"],
    [["a.out > z.in"], "0.to.stage", "There is no stage z"],
    [["a.nothing > b.in"], "0.from.port", "It has: out."],
    [["a.in > b.in"], "0.from.port", "is an input, not an output"],
    [["a.out > b.out"], "0.to.port", "is an output, not an input"],
    [["trigger.out > a.in"], "0.to.port", "carries a trigger, but audio in of a carries sound"],
    [["a.out > cell.bias"], "0.to.port", "a bias current"],
    [["trigger.out > a.strike"], "0.to.port", "a has no port strike in this network. It has: in."],
    [["a.out > b.in", "c.out > b.in"], "1.to.port", "fed by link 1 already"],
    [["a.out > a.in"], "0", "a → a"],
    [["a.out > b.in", "b.out > c.in", "c.out > a.in"], "2", "a → b → c → a"],
  ])("%j are refused at %s", (links, place, words) => {
    const faults = faultsOf(...links);
    expect(faults).toHaveLength(1);
    expect(faults[0]![0]).toBe(place);
    expect(faults[0]![1]).toContain(words);
  });

  test("a stage of a kind that this version does not know keeps its links", () => {
    const odd = { ...stages[0]!, id: "odd", kind: "unheard-of" };
    expect(linkFaults([...stages, odd], linksOf("odd.out > b.in"), find)).toEqual([]);
  });
});

test("the order of the signal puts every stage after those that feed it, and keeps the voice's order else", () => {
  const { stages: all, links } = twoPaths();
  const order = signalOrder(all, links);
  expect([...order].sort()).toEqual(all.map(({ id }) => id).sort());
  for (const { from, to } of links) expect(order.indexOf(from.stage)).toBeLessThan(order.indexOf(to.stage));
  expect(signalOrder(all, [])).toEqual(all.map(({ id }) => id));
  expect(() => signalOrder(stages, linksOf("a.out > b.in", "b.out > a.in"))).toThrow("circle");
});
