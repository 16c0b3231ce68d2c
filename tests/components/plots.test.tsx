import { renderToString } from "react-dom/server";
import { describe, expect, test } from "vitest";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { startingStateWithPots } from "#lib/wire/stageState.ts";
import { rowsOf } from "../../src/components/plot/exportPlot.tsx";
import { PlotDrawing } from "../../src/components/plot/PlotDrawing.tsx";
import { plotModel } from "../../src/components/plot/plotModel.ts";

const room = { width: 640, height: 340 };
const topologies = stageKinds.flatMap((kind) =>
  kind.topologies.map((topology) => ({ name: `${kind.id}, ${topology.id}`, topology })),
);

describe.each(topologies)("files of the curves of $name", ({ topology }) => {
  const state = startingStateWithPots(topology);
  const models = topology.curves.map((curve) => plotModel(topology, curve, state, room)!);

  test("every curve has something to draw, with axes that name their units, from left to right", () => {
    expect(models.length).toBeGreaterThan(0);
    for (const [i, model] of models.entries()) {
      expect(model, topology.curves[i]!.id).toBeDefined();
      for (const axis of [model.x, model.y]) {
        expect(axis.ticks.length, `${model.id}: ${axis.title}`).toBeGreaterThan(1);
        if (axis.unit !== "") expect(axis.plainTitle).toContain(`, ${axis.unit}`);
      }
      expect([...model.xs].sort((a, b) => a - b)).toEqual(model.xs);
    }
  });

  test("a drawing that stands alone names the plot and its axes, and holds no figure that is none", () => {
    for (const model of models) {
      const svg = renderToString(<PlotDrawing model={model} room={room} alone />);
      for (const text of [model.name, model.x.title, model.y.title]) {
        expect(svg.replaceAll("&#x27;", "'").replaceAll("&amp;", "&")).toContain(text);
      }
      expect(svg).toMatch(/<path[^>]* d="M/);
      expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    }
  });

  test("a table has a head for every line, with plain units, and a figure at every point", () => {
    for (const model of models) {
      const [head, ...rows] = rowsOf(model);
      expect(head).toEqual([model.x.plainTitle, ...model.lines.map(({ label }) => `${model.y.plainTitle} (${label})`)]);
      expect(rows.length).toBe(model.xs.length);
      for (const row of rows) {
        expect(row.length).toBe(head!.length);
        for (const cell of row) expect(cell === "" || Number.isFinite(cell)).toBe(true);
      }
    }
  });
});

test("a burst's short peaks are all drawn as high as they are", () => {
  const peaked = topologies.find(({ topology }) => "hitTimes" in topology.results)!.topology;
  const model = plotModel(peaked, peaked.curves[0]!, startingStateWithPots(peaked), room)!;
  const ys = model.lines[0]!.ys.map((y) => y ?? 0);
  const top = Math.max(...ys);
  const peaks = ys.filter((y, i) => i > 0 && i < ys.length - 1 && y > ys[i - 1]! && y >= ys[i + 1]!);
  expect(peaks.length).toBeGreaterThanOrEqual(4);
  for (const peak of peaks) expect(peak / top).toBeGreaterThan(0.9);
});
