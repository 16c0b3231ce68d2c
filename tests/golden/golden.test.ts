import { describe, expect, it } from "vitest";
import { declaredChanges, libraryVersion, type DeclaredChange } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { differences, recompute, type GoldenRevision } from "./revision.ts";

const files = import.meta.glob<GoldenRevision>("./*/*.json", { eager: true, import: "default" });
const revisions = Object.entries(files);

const topologyOf = ({ stage }: GoldenRevision) =>
  stageKinds.find(({ id }) => id === stage.kind)?.topologies.find(({ id }) => id === stage.topology);

/** Negative where `a` is the older version. */
const byVersion = (a: string, b: string) => a.localeCompare(b, "en", { numeric: true });

const explains = (change: DeclaredChange, { libraryVersion: saved, stage }: GoldenRevision, result: string) =>
  change.kind === stage.kind &&
  change.topology === stage.topology &&
  change.result === result &&
  byVersion(saved, change.version) < 0;

describe("golden revisions", () => {
  it("hold every topology (record one with node --import tsx tests/golden/record.ts)", () => {
    const held = new Set(revisions.map(([, { stage }]) => `${stage.kind}/${stage.topology}`));
    const all = stageKinds.flatMap((kind) => kind.topologies.map((topology) => `${kind.id}/${topology.id}`));
    expect(all.filter((name) => !held.has(name))).toEqual([]);
  });

  it.each(revisions)("%s gives the saved figures, or a declared change says why not", (_, revision) => {
    const topology = topologyOf(revision);
    expect(topology, "the topology is still there").toBeDefined();
    const now = recompute(topology!, revision.stage);
    const moved = differences(revision.results, now.results);
    const unexplained = moved.filter((result) => !declaredChanges.some((change) => explains(change, revision, result)));
    expect(
      unexplained.map(
        (result) => `${result}: saved ${String(revision.results[result])}, now ${String(now.results[result])}`,
      ),
    ).toEqual([]);
    // A warning may come or go only along with a figure.
    if (moved.length === 0) expect(now.warnings).toEqual(revision.warnings);
  });

  it("has use for every declared change, each with a reason and of a version that exists", () => {
    for (const change of declaredChanges) {
      const name = `${change.version} ${change.kind}/${change.topology} ${change.result}`;
      expect(change.reason.length, name).toBeGreaterThan(20);
      expect(byVersion(change.version, libraryVersion), name).toBeLessThanOrEqual(0);
      const explained = revisions.filter(([, revision]) => {
        const topology = topologyOf(revision);
        if (!topology || !explains(change, revision, change.result)) return false;
        return differences(revision.results, recompute(topology, revision.stage).results).includes(change.result);
      });
      expect(explained.length, name).toBeGreaterThan(0);
    }
  });

  it("stand in the folder of the version that gave them", () => {
    for (const [path, revision] of revisions) expect(path).toContain(`./${revision.libraryVersion}/`);
  });
});
