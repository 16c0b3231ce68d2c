import { useId, useState } from "react";
import "../../styles/panel.css";
import { Contained } from "../page/Contained.tsx";
import type { StagePanel, StagePanelProps } from "./stagePanels.ts";

/** The panels that have something to say of this stage, each closed until it is asked for. */
export function StagePanels({ panels, stage }: { panels: readonly StagePanel[]; stage: StagePanelProps }) {
  const fitting = panels.filter(({ fits }) => fits?.(stage.topology) ?? true);
  if (fitting.length === 0) return null;
  return (
    <section className="stage-panels needs-js no-print" aria-label="Further questions">
      {fitting.map((panel) => (
        <PanelPlace key={panel.id} panel={panel} stage={stage} />
      ))}
    </section>
  );
}

function PanelPlace({ panel, stage }: { panel: StagePanel; stage: StagePanelProps }) {
  const [open, setOpen] = useState(false);
  const id = useId();
  return (
    <div className="stage-panel">
      <div className="stage-panel-head">
        <h3>
          <button type="button" aria-expanded={open} aria-controls={id} onClick={() => setOpen(!open)}>
            {panel.name}
          </button>
        </h3>
        <p className="text-ink-2">{panel.says}</p>
      </div>
      <div id={id} hidden={!open}>
        {open && (
          <Contained what={panel.name}>
            <panel.View {...stage} />
          </Contained>
        )}
      </div>
    </div>
  );
}
