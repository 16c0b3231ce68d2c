import { useId } from "react";
import { turnedPots } from "#lib/circuit/analysis/trim/index.ts";
import "../../styles/spread.css";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { AskTrim } from "./AskTrim.tsx";
import { RevaluePart } from "./RevaluePart.tsx";
import { TrimFiguresPart } from "./TrimFiguresPart.tsx";
import { TrimPlots } from "./TrimPlots.tsx";
import { useTrim } from "./useTrim.ts";

/** Whether a pot reaches what it must, on every board, and with how much of its travel. */
export function TrimPanel(props: StagePanelProps) {
  if (turnedPots(props.topology, props.state.parts).length > 0) return <Turned {...props} />;
  return (
    <p className="note">
      No pot is fitted, so there is nothing to turn. Give the pot a value among the parts, and its travel is judged
      here.
    </p>
  );
}

function Turned(props: StagePanelProps) {
  const trim = useTrim(props);
  const id = useId();
  const { topology, kind } = props;
  return (
    <div className="spread trim">
      <div className="spread-cols">
        <div className="spread-ask">
          <AskTrim {...props} trim={trim} id={id} />
        </div>
        <div className="spread-answer">
          {trim.failed && (
            <p className="fault" role="alert">
              <strong>The trim could not be worked out.</strong> This browser could not run the calculation. Nothing on
              the sheet is lost; load the page again.
            </p>
          )}
          <TrimFiguresPart topology={topology} trim={trim} />
          <RevaluePart {...props} trim={trim} id={id} />
        </div>
      </div>
      {trim.figures && <TrimPlots topology={topology} trim={trim} fileName={`${kind.id}-${topology.id}-trim`} />}
    </div>
  );
}
