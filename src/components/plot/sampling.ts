interface Sampled {
  xs: number[];
  /** Of each line, at each x. */
  ys: number[][];
}

interface Scale {
  /** Whether the axis of y is logarithmic. */
  logarithmic: boolean;
  /** How far below its top the plot reaches at most, in units of y. */
  reach: number;
}

/** A bend is seen where a straight stroke across two steps would miss the curve by more than this share of the plot. */
const seen = 0.008;
/** Halvings of a step of the first spacing. */
const rounds = 5;
const mostPoints = 1200;

/**
 * The lines at the given x, and at more of them wherever a line bends too sharply for straight strokes: a burst's short
 * peaks, each swing of a ring. A gently bent line costs nothing more.
 */
export function sampled(xs: readonly number[], lines: readonly ((x: number) => number)[], scale: Scale): Sampled {
  const values = new Map<number, number[]>(xs.map((x) => [x, lines.map((at) => at(x))]));
  let places = [...xs];
  for (let round = 0; round < rounds; round++) {
    const spans = lines.map((_, line) =>
      spanOf(
        places.map((x) => values.get(x)![line]!),
        scale,
      ),
    );
    const bent = new Set<number>();
    for (let i = 1; i < places.length - 1; i++) {
      const [a, b, c] = [values.get(places[i - 1]!)!, values.get(places[i]!)!, values.get(places[i + 1]!)!];
      const share = (places[i]! - places[i - 1]!) / (places[i + 1]! - places[i - 1]!);
      const bends = lines.some((_, line) => {
        const [before, here, after] = [a[line]!, b[line]!, c[line]!].map((y) => drawn(y, spans[line]!, scale));
        return Math.abs(before! + (after! - before!) * share - here!) > seen;
      });
      if (bends) bent.add(i - 1).add(i);
    }
    const between = [...bent]
      .map((i) => (places[i]! + places[i + 1]!) / 2)
      .filter((x) => !values.has(x))
      .slice(0, Math.max(0, mostPoints - places.length));
    if (between.length === 0) break;
    for (const x of between) {
      values.set(
        x,
        lines.map((at) => at(x)),
      );
    }
    places = [...places, ...between].sort((a, b) => a - b);
  }
  return { xs: places, ys: lines.map((_, line) => places.map((x) => values.get(x)![line]!)) };
}

interface Span {
  least: number;
  most: number;
}

function spanOf(ys: readonly number[], { logarithmic, reach }: Scale): Span {
  const heights = ys.map((y) => (logarithmic ? Math.log(y) : y)).filter(Number.isFinite);
  const most = heights.reduce((a, b) => Math.max(a, b), -Infinity);
  const lowest = heights.reduce((a, b) => Math.min(a, b), Infinity);
  // The last digits of a level line are no bends.
  return { least: Math.min(Math.max(most - reach, lowest), most - Math.abs(most) * 1e-6), most };
}

/** Where y stands in the plot's height, from 0 to 1; what lies below the plot, or is no figure, at its foot. */
function drawn(y: number, { least, most }: Span, { logarithmic }: Scale): number {
  const height = ((logarithmic ? Math.log(y) : y) - least) / (most - least);
  return Number.isFinite(height) ? Math.max(0, height) : 0;
}
