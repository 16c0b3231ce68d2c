import { useState } from "react";
import type { PlotModel } from "./plotModel.ts";

/** Takes the plot away as a file. The code for it is fetched when it is first asked for. */
export function PlotActions({ model, fileName }: { model: PlotModel; fileName: string }) {
  const [failed, setFailed] = useState(false);
  const name = `${fileName}-${model.id}`;
  const take = async (format: "svg" | "png" | "csv") => {
    setFailed(false);
    try {
      const files = await import("./exportPlot.tsx");
      if (format === "svg") files.saveSvg(model, name);
      else if (format === "png") await files.savePng(model, name);
      else files.saveCsv(model, name);
    } catch {
      setFailed(true);
    }
  };
  return (
    <span className="plot-actions needs-js no-print">
      {(["svg", "png", "csv"] as const).map((format) => (
        <button
          key={format}
          type="button"
          className="btn-text"
          aria-label={`${model.name} as ${format.toUpperCase()}`}
          onClick={() => void take(format)}
        >
          {format.toUpperCase()}
        </button>
      ))}
      <span role="status">{failed ? "The file could not be made. Check the connection and try again." : ""}</span>
    </span>
  );
}
