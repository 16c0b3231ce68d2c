import type { CompareAnswer } from "./compare.ts";
import { csvText, type Cell } from "./csvText.ts";

const cell = (value: number | string | readonly number[] | undefined): Cell =>
  typeof value === "object" ? value.join(" ") : (value ?? "");

/** A comparison as one table, in SI base units; the first column says what each row is about. */
export function compareCsv(found: CompareAnswer): string {
  const names = new Map([...found.stages.added, ...found.stages.changed].map(({ stage, name }) => [stage, name]));
  for (const { stage, name } of found.stages.removed) if (!names.has(stage)) names.set(stage, name);
  const name = (stage: string) => names.get(stage) ?? stage;
  const rows: Cell[][] = [
    ["what", "stage", "designator", "name", "from", "to", "unit", "change", "verdict"],
    ...found.stages.added.map((stage) => ["stage added", stage.name, "", stage.kind, "", stage.topology, "", "", ""]),
    ...found.stages.removed.map((stage) => [
      "stage removed",
      stage.name,
      "",
      stage.kind,
      stage.topology,
      "",
      "",
      "",
      "",
    ]),
    ...found.parts.map((p) => [
      ...["part", name(p.stage), p.designator, p.label],
      ...[cell(p.from), cell(p.to), p.unit, cell(p.change), p.designatorBefore ? `was ${p.designatorBefore}` : ""],
    ]),
    ...settings("target", found.targets, name),
    ...settings("condition", found.conditions, name),
    ...found.results.map((r) => [
      ...["result", name(r.stage), "", r.label],
      ...[cell(r.from), cell(r.to), r.unit, cell(r.change), r.verdict],
    ]),
    ...found.warnings.gone.map((w) => [
      "warning gone",
      name(w.stage),
      "",
      w.message,
      w.value,
      "",
      w.unit,
      "",
      w.severity,
    ]),
    ...found.warnings.new.map((w) => [
      "warning new",
      name(w.stage),
      "",
      w.message,
      "",
      w.value,
      w.unit,
      "",
      w.severity,
    ]),
    ...found.levels.map((l) => [
      ...["level, V RMS", name(l.stage), "", l.label, cell(l.from?.rms), cell(l.to?.rms), "V", "", ""],
    ]),
    ...(["positive", "negative"] as const).flatMap((rail) =>
      found.supply
        ? [["supply", "", "", `${rail} rail`, found.supply[rail].from, found.supply[rail].to, "A", "", ""] as Cell[]]
        : [],
    ),
    ...found.quantities.map((q) => [
      ...["parts list", "", "", `${q.partClass} ${q.value}`, q.from, q.to, q.unit, q.to - q.from],
      q.newUnique ? "used once" : "",
    ]),
  ];
  return csvText(rows);
}

function settings(what: string, changes: CompareAnswer["targets"], name: (stage: string) => string): Cell[][] {
  return changes.map((s) => [
    ...[what, name(s.stage), "", s.label],
    ...[cell(s.from), cell(s.to), s.unit, cell(s.change), ""],
  ]);
}
