import { existsSync, readdirSync, readFileSync } from "node:fs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  acceptedRange,
  analyseStage,
  completeConditions,
  defaultParts,
  defaultTargets,
  designExactly,
  isRefusal,
  plotStage,
  type AnyTopology,
  type PlainConditions,
  type PlainValues,
  type ReferenceCase,
  type StageKind,
} from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { expectRelative } from "../support/approx.ts";
import { deepFreeze } from "../support/deepFreeze.ts";
import { analyseChange, codesOf, requestOf, type LimitCase } from "../support/limitCase.ts";
import { sectionsOf, sentencesOf, works } from "../support/notes.ts";
import { conditionsOf, partsOf, runs, targetsOf } from "../support/random.ts";

const kindsFolder = new URL("../../src/lib/circuit/kinds/", import.meta.url);
const caseFiles = import.meta.glob<{ limitCases: readonly LimitCase[] }>("./*/limitCases.ts", { eager: true });
const limitCasesOf = (kind: StageKind): readonly LimitCase[] =>
  caseFiles[`./${kind.id}/limitCases.ts`]?.limitCases ?? [];

const headings = ["What it does", "Formula", "Symbols", "Leaves out", "Sources"];
const required = ["index.ts", "fields.ts", "model.ts", "sources.ts", "reference.ts", "notes.md"];

describe("the registry", () => {
  it("names each folder once, and each entry has its folder", () => {
    const folders = readdirSync(kindsFolder, { withFileTypes: true }).filter((entry) => entry.isDirectory());
    expect(stageKinds.map(({ id }) => id).sort()).toEqual(folders.map(({ name }) => name).sort());
  });

  it("has limit cases for every kind with limits, and for no kind that does not exist", () => {
    const found = Object.keys(caseFiles).map((path) => path.split("/")[1]);
    const withLimits = stageKinds.filter((kind) => kind.topologies.some(({ limits }) => limits.length > 0));
    expect(found.sort()).toEqual(withLimits.map(({ id }) => id).sort());
  });
});

describe.each(stageKinds.map((kind) => [kind.id, kind] as const))("%s", (_, kind) => {
  it.each(required)("has %s", (file) => {
    expect(existsSync(new URL(`${kind.id}/${file}`, kindsFolder))).toBe(true);
  });

  describe("its notes", () => {
    const notes = readFileSync(new URL(`${kind.id}/notes.md`, kindsFolder), "utf8");
    const sections = sectionsOf(notes);

    it("have the fixed headings in order, each with text", () => {
      expect([...sections.keys()]).toEqual(headings);
      expect([...sections.values()].filter((text) => text.length < 40)).toEqual([]);
    });

    it("work an example whose figures are those of a reference case", () => {
      const worked = sentencesOf(sections.get("Formula") ?? "").filter((sentence) =>
        kind.reference.some((one) => works(sentence, one)),
      );
      expect(worked.length, "sentences of the Formula section that work a reference case").toBeGreaterThan(0);
    });

    it("link to nothing that is missing", () => {
      const folder = new URL(`${kind.id}/`, kindsFolder);
      const links = [...notes.matchAll(/\]\(([^)\s]+)\)/g)].map(([, target]) => target!);
      const dead = links.filter(
        (target) => !target.startsWith("https:") && !existsSync(new URL(target.split("#")[0]!, folder)),
      );
      expect(dead).toEqual([]);
    });
  });

  it("gives every reference case an id of its own, a known topology, a source and a tight tolerance", () => {
    const ids = kind.reference.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const one of kind.reference) {
      expect(
        kind.topologies.map(({ id }) => id),
        one.id,
      ).toContain(one.topology);
      expect(one.source.title, one.id).not.toBe("");
      expect(one.source.place, one.id).not.toBe("");
      expect(one.tolerance, one.id).toBeLessThanOrEqual(0.05);
      expect(Object.keys(one.expect).length, one.id).toBeGreaterThan(0);
    }
  });

  it("keeps limit cases for its own topologies and codes only", () => {
    for (const { topology, code } of limitCasesOf(kind)) {
      const found = kind.topologies.find(({ id }) => id === topology);
      expect(
        found?.limits.map((limit) => limit.code),
        `${topology}/${code}`,
      ).toContain(code);
    }
  });

  describe.each(kind.topologies.map((topology) => [topology.id, topology] as const))("%s", (__, topology) => {
    const cases = limitCasesOf(kind).filter((one) => one.topology === topology.id);
    const references = kind.reference.filter((one) => one.topology === topology.id);
    const hasTargets = Object.keys(topology.targets).length > 0;

    it("starts with values inside their ranges", () => {
      const fields = { ...topology.parts, ...topology.conditions, ...topology.targets };
      for (const [key, field] of Object.entries(fields)) {
        if (field.type === "choice") {
          expect(
            field.options.map(({ value }) => value),
            key,
          ).toContain(field.default);
          continue;
        }
        const [lowest, highest] = acceptedRange(field);
        expect(field.least, key).toBeLessThan(field.most);
        expect(lowest, key).toBeLessThanOrEqual(field.least);
        expect(highest, key).toBeGreaterThanOrEqual(field.most);
        for (const value of [field.default, field.suggestion ?? null]) {
          if (value === null) continue;
          expect(value, key).toBeGreaterThanOrEqual(field.least);
          expect(value, key).toBeLessThanOrEqual(field.most);
        }
      }
    });

    it("traces every result to a formula, and every formula and limit to a source", () => {
      const sourceIds = topology.sources.map(({ id }) => id);
      const formulaIds = topology.formulas.map(({ id }) => id);
      for (const [key, result] of Object.entries(topology.results)) {
        expect(result.label, key).not.toBe("");
        expect(result.unit, key).toBeTypeOf("string");
        expect(formulaIds, key).toContain(result.formula);
      }
      for (const formula of topology.formulas) {
        expect(formula.sources.length, formula.id).toBeGreaterThan(0);
        expect(sourceIds, formula.id).toEqual(expect.arrayContaining([...formula.sources]));
      }
      for (const limit of topology.limits) expect(sourceIds, limit.code).toContain(limit.source);
      expect(new Set(formulaIds).size, "formula ids are distinct").toBe(formulaIds.length);
      expect(new Set(sourceIds).size, "source ids are distinct").toBe(sourceIds.length);
    });

    it("draws every part once, and no part that it does not have", () => {
      const drawn = topology.network.items.flatMap((item) => ("part" in item ? [item.part] : []));
      expect(drawn.sort()).toEqual(Object.keys(topology.parts).sort());
    });

    it("has at least two published or computed points", () => {
      expect(references.length).toBeGreaterThanOrEqual(2);
    });

    it.each(references.map((one) => [one.id, one] as const))("reproduces %s", (___, one) => {
      const got = answerTo(topology, one);
      for (const [key, value] of Object.entries(one.expect))
        expectRelative(got[key], value, one.tolerance, `${one.id} (${one.source.title}, ${one.source.place}) ${key}`);
    });

    it("gives finite figures at its start, without a fault", () => {
      const { results, warnings } = analyseChange(topology);
      expect(warnings.filter(({ severity }) => severity === "fault")).toEqual([]);
      for (const key of kind.telling) expect(results[key], key).toBeDefined();
    });

    it("analyses without touching what it is given, and alike each time", () => {
      fc.assert(
        fc.property(partsOf(topology), conditionsOf(topology), (parts, conditions) => {
          const request = deepFreeze({ parts, conditions, targets: defaultTargets(topology) });
          expect(analyseStage(topology, request)).toEqual(analyseStage(topology, structuredClone(request)));
        }),
        runs(40),
      );
    });

    it("never lets NaN or infinity out, nor drops a figure unsaid, in the usual range and ten times past it", () => {
      fc.assert(
        fc.property(partsOf(topology, 10), conditionsOf(topology, 10), (parts, conditions) =>
          expectFiniteOrSaid(topology, parts, conditions),
        ),
        runs(300),
      );
    });

    it("returns its targets: solve, then analyse", () => {
      if (!hasTargets) return;
      expect(solveThenAnalyse(topology, defaultTargets(topology), {}), "the targets it starts with").toBe("met");
      // Without parts there is nothing to solve for: such a topology meets its targets or refuses them.
      if (Object.keys(topology.parts).length === 0) return;
      const outcomes: string[] = [];
      fc.assert(
        fc.property(targetsOf(topology), conditionsOf(topology), (targets, conditions) => {
          outcomes.push(solveThenAnalyse(topology, targets, conditions));
        }),
        runs(60),
      );
      // Refusals are allowed, but a topology that refuses almost everything shows nothing here.
      expect(outcomes.filter((outcome) => outcome === "met").length).toBeGreaterThanOrEqual(6);
    });

    it("draws finite curves at its start", () => {
      for (const line of plotStage(topology, requestOf(topology)))
        expect(line.points.length, `${line.id}/${line.line}`).toBe(241);
      expect(new Set(topology.curves.map(({ id }) => id)).size).toBe(topology.curves.length);
    });

    it("has a case for every limit", () => {
      const codes = topology.limits.map(({ code }) => code);
      expect(new Set(codes).size, "codes are distinct").toBe(codes.length);
      expect(
        codes.filter((code) => !cases.some((one) => one.code === code)),
        "limits that no case raises",
      ).toEqual([]);
    });

    it.each(cases.map((one) => [one.code, one] as const))("raises %s, and not without cause", (code, one) => {
      expect(codesOf(analyseChange(topology, one.raised))).toContain(code);
      expect(codesOf(analyseChange(topology, one.quiet))).not.toContain(code);
    });

    it("reaches every result it declares", () => {
      const changes = [{}, ...cases.flatMap(({ raised, quiet }) => [raised, quiet])];
      const reached = changes.flatMap((change) => Object.keys(analyseChange(topology, change).results));
      expect(Object.keys(topology.results).filter((key) => !reached.includes(key))).toEqual([]);
    });
  });
});

/** Results of the given parts, or the parts for the given targets. */
function answerTo(topology: AnyTopology, { given }: ReferenceCase): Record<string, unknown> {
  const { parts = {}, targets, conditions = {} } = given;
  if (!targets) return analyseStage(topology, { parts: { ...defaultParts(topology), ...parts }, conditions }).results;
  const designed = designExactly(topology, targets, conditions, parts);
  return isRefusal(designed) ? expect.fail(designed.message) : designed;
}

function expectFiniteOrSaid(topology: AnyTopology, parts: PlainValues, given: PlainConditions): void {
  const conditions = completeConditions(topology, given);
  const raw = topology.analyse({ parts, conditions: conditions as never });
  const { results, warnings } = analyseStage(topology, { parts, conditions });
  for (const [key, value] of Object.entries(results)) {
    expect(topology.results, "a result that is not declared").toHaveProperty(key);
    expect([value].flat().every(Number.isFinite), key).toBe(true);
  }
  const dropped = Object.keys(raw).filter((key) => raw[key] !== undefined && !(key in results));
  expect(warnings.filter(({ code }) => code === "no-figure").length, dropped.join()).toBe(dropped.length);
  for (const { code, value, limit, message } of warnings) {
    expect([value, limit].every(Number.isFinite), code).toBe(true);
    expect(message, code).not.toMatch(/NaN|undefined|[{}]|Infinity/);
  }
}

function solveThenAnalyse(topology: AnyTopology, targets: PlainValues, conditions: PlainConditions) {
  const anchored = topology.anchors.flatMap(({ part, follows = [] }) =>
    [part, ...follows].map((key) => [key, topology.parts[key]!.default]),
  );
  const parts = designExactly(topology, targets, conditions, Object.fromEntries(anchored) as PlainValues);
  if (isRefusal(parts)) {
    expect({ ...topology.targets, ...topology.conditions, ...topology.parts }).toHaveProperty(parts.field);
    expect(parts.message).toMatch(/\.$/);
    return "refused";
  }
  const { results } = analyseStage(topology, { parts, conditions });
  for (const [key, wanted] of Object.entries(targets))
    expectRelative(results[topology.targets[key]!.result], wanted, 1e-9, `${topology.id} ${key}`);
  return "met";
}
