import { useDeferredValue, useId } from "react";
import "../../styles/spread.css";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { AskBoards } from "./AskBoards.tsx";
import { AskWindows } from "./AskWindows.tsx";
import { PartsSpread } from "./PartsSpread.tsx";
import { RemedyPart } from "./RemedyPart.tsx";
import { SpreadFigures } from "./SpreadFigures.tsx";
import { SpreadPlots } from "./SpreadPlots.tsx";
import { useSpread } from "./useSpread.ts";

/** How far boards stray, and how many of them are good: drawn live beside the page. */
export function SpreadPanel(props: StagePanelProps) {
  const spread = useSpread(props);
  const drawn = useDeferredValue(spread.view);
  const id = useId();
  const { topology, kind } = props;
  return (
    <div className="spread">
      <div className="spread-cols">
        <div className="spread-ask">
          <AskWindows topology={topology} state={props.state} spread={spread} id={id} />
          <AskBoards topology={topology} spread={spread} id={id} />
        </div>
        <div className="spread-answer">
          <SpreadFigures topology={topology} spread={spread} />
          <PartsSpread {...props} spread={spread} id={id} />
          <RemedyPart {...props} spread={spread} id={id} />
        </div>
      </div>
      {drawn && (
        <SpreadPlots topology={topology} spread={spread} view={drawn} fileName={`${kind.id}-${topology.id}-spread`} />
      )}
    </div>
  );
}
