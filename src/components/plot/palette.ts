/** Colours as values of SVG attributes: variables on the page, plain colours in a file. */
export interface PlotPalette {
  curves: readonly string[];
  ink: string;
  faint: string;
  rule: string;
  sheet: string;
  window: string;
  windowEdge: string;
}

const orders = [1, 2, 3, 4, 5, 6];

/** Okabe-Ito in a fixed order, light or dark as the page is. */
export const pagePalette: PlotPalette = {
  curves: orders.map((n) => `var(--c${n})`),
  ink: "var(--ink-2)",
  faint: "var(--ink-3)",
  rule: "var(--rule)",
  sheet: "var(--sheet)",
  window: "var(--accent-soft)",
  windowEdge: "var(--accent)",
};

/** Each line's own dash, so that a greyscale print still tells them apart. */
const dashes = [undefined, "2 3", "7 4", "9 3 2 3", "12 4", "4 2 1 2 1 2"];

export const colourOf = (palette: PlotPalette, index: number) => palette.curves[index % palette.curves.length]!;
export const dashOf = (index: number) => dashes[index % dashes.length];
export const strokeOf = (index: number) => (index === 0 ? 2 : 1.6);
