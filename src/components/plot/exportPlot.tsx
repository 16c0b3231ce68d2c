import { flushSync } from "react-dom";
import { createRoot } from "react-dom/client";
import { takeAwayCsv } from "#lib/client/csv.ts";
import type { PlotPalette } from "./palette.ts";
import { PlotDrawing } from "./PlotDrawing.tsx";
import type { PlotModel } from "./plotModel.ts";

const room = { width: 900, height: 480 };

/** Reads the colours of light paper off the page's own variables, whatever theme is shown: a file is for paper. */
function paperPalette(): PlotPalette {
  const probe = document.createElement("span");
  probe.className = "paper-probe";
  document.body.append(probe);
  const read = (name: string) => {
    probe.dataset.colour = name;
    probe.style.color = `var(--${name})`;
    return getComputedStyle(probe).color;
  };
  const palette = {
    curves: [1, 2, 3, 4, 5, 6].map((n) => read(`c${n}`)),
    ink: read("ink-2"),
    faint: read("ink-3"),
    rule: read("rule"),
    sheet: read("sheet"),
    window: read("accent-soft"),
    windowEdge: read("accent"),
  };
  probe.remove();
  return palette;
}

function svgText(model: PlotModel): string {
  const host = document.createElement("div");
  const root = createRoot(host);
  flushSync(() => root.render(<PlotDrawing model={model} room={room} palette={paperPalette()} alone />));
  const text = host.innerHTML;
  root.unmount();
  return text;
}

function save(name: string, blob: Blob) {
  const address = URL.createObjectURL(blob);
  const link = document.createElement("a");
  link.href = address;
  link.download = name;
  link.click();
  // The download reads the address after this task has ended.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

export function saveSvg(model: PlotModel, name: string): void {
  save(`${name}.svg`, new Blob([svgText(model)], { type: "image/svg+xml" }));
}

export async function savePng(model: PlotModel, name: string): Promise<void> {
  const image = new Image();
  // A data address, since a blob one would need to be allowed by the page's policy for images.
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(svgText(model))}`;
  await image.decode();
  const canvas = document.createElement("canvas");
  canvas.width = image.naturalWidth * 2;
  canvas.height = image.naturalHeight * 2;
  canvas.getContext("2d")?.drawImage(image, 0, 0, canvas.width, canvas.height);
  canvas.toBlob((blob) => blob && save(`${name}.png`, blob), "image/png");
}

export function saveCsv(model: PlotModel, name: string): void {
  takeAwayCsv(`${name}.csv`, rowsOf(model));
}

/** Every point of every line, with quantity and unit in the head. */
export function rowsOf(model: PlotModel): (string | number)[][] {
  const head = [model.x.plainTitle, ...model.lines.map((line) => `${model.y.plainTitle} (${line.label})`)];
  const rows = model.xs.map((x, i) => [x, ...model.lines.map((line) => line.ys[i] ?? "")]);
  return [head, ...rows];
}
