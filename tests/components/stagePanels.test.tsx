import { renderToString } from "react-dom/server";
import { expect, test, vi } from "vitest";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { kindBrief } from "#lib/wire/kindBrief.ts";
import { startingState } from "#lib/wire/stageState.ts";
import { later } from "../../src/components/page/later.tsx";
import { StagePanels } from "../../src/components/sheet/StagePanels.tsx";
import { stagePanels, type StagePanel, type StagePanelProps } from "../../src/components/sheet/stagePanels.ts";

const kind = stageKinds[0]!;
const topology = kind.topologies[0]!;
const stage: StagePanelProps = {
  kind: kindBrief(kind),
  topology,
  state: startingState(topology),
  designators: {},
  readOnly: false,
  apply: () => undefined,
};

const panel = (id: string, more: Partial<StagePanel> = {}): StagePanel => ({
  id,
  name: `Panel ${id}`,
  says: `What ${id} answers.`,
  View: () => <p>inside {id}</p>,
  ...more,
});

test("a panel is named and explained, and nothing of it runs before it is opened", () => {
  const load = vi.fn(() => Promise.resolve(() => <p>inside</p>));
  const page = renderToString(<StagePanels panels={[panel("a", { View: later(load) })]} stage={stage} />);
  expect(page).toMatch(/<button[^>]*aria-expanded="false"[^>]*>Panel a<\/button>/);
  expect(page).toContain("What a answers.");
  expect(page).not.toContain("inside");
  expect(load).not.toHaveBeenCalled();
});

test("a panel that has nothing to say of the topology is left out, and no empty section stays", () => {
  const asked = vi.fn(() => false);
  const page = renderToString(<StagePanels panels={[panel("a", { fits: asked }), panel("b")]} stage={stage} />);
  expect(asked).toHaveBeenCalledWith(topology);
  expect(page).not.toContain("Panel a");
  expect(page).toContain("Panel b");
  expect(renderToString(<StagePanels panels={[panel("a", { fits: asked })]} stage={stage} />)).toBe("");
});

test("the panels of the sheet have ids of their own, and say in a sentence what they answer", () => {
  expect(new Set(stagePanels.map(({ id }) => id)).size).toBe(stagePanels.length);
  for (const { name, says } of stagePanels) expect(says, name).toMatch(/[.?]$/);
});
