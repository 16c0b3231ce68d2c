/** Ticks of a logarithmic axis on 1-2-5 steps; on whole decades where those would stand too close together. */
export function logarithmicTicks(least: number, most: number, room: number): number[] {
  const rows = [[1, 2, 5], [1, 3], [1]].map((mantissas) => mantissasBetween(mantissas, least, most));
  const fitting = rows.find((ticks) => ticks.length <= room);
  if (fitting && fitting.length >= 2) return fitting;
  const decades = rows[2]!;
  if (decades.length <= room) return rows[0]!.length >= 2 ? thinned(rows[0]!, room) : decades;
  return thinned(decades, room);
}

function mantissasBetween(mantissas: readonly number[], least: number, most: number): number[] {
  const ticks: number[] = [];
  for (let decade = Math.floor(Math.log10(least) + 1e-9); decade <= Math.ceil(Math.log10(most)); decade++) {
    for (const mantissa of mantissas) {
      // From text, so that 2 × 10⁻⁹ is the double nearest to it.
      const tick = Number(`${mantissa}e${decade}`);
      if (tick >= least * (1 - 1e-9) && tick <= most * (1 + 1e-9)) ticks.push(tick);
    }
  }
  return ticks;
}

function thinned(ticks: number[], room: number): number[] {
  const stride = Math.ceil(ticks.length / Math.max(2, room));
  return ticks.filter((_, i) => i % stride === 0);
}

const decimalSteps = [1, 2, 5, 10] as const;
/** Divisions of a turn that people read at a glance. */
const angularSteps = [1, 2, 5, 10, 15, 30, 45, 90, 180, 360] as const;

export interface LinearTicks {
  /** First and last tick: the stretch to draw. */
  domain: [number, number];
  ticks: number[];
}

/** Even ticks on 1-2-5 steps (parts of a turn for degrees), the stretch widened to whole steps unless `exact`. */
export function linearTicks(
  least: number,
  most: number,
  room: number,
  { angle = false, exact = false }: { angle?: boolean; exact?: boolean } = {},
): LinearTicks {
  const [from, to] = least === most ? aroundOne(least) : [least, most];
  const step = stepFor((to - from) / Math.max(1, room - 1), angle && to - from >= 4);
  const first = exact ? Math.ceil(from / step - 1e-9) : Math.floor(from / step + 1e-9);
  const last = exact ? Math.floor(to / step + 1e-9) : Math.ceil(to / step - 1e-9);
  const ticks = Array.from({ length: last - first + 1 }, (_, i) => clean((first + i) * step));
  return { domain: exact ? [from, to] : [ticks[0]!, ticks.at(-1)!], ticks };
}

function aroundOne(value: number): [number, number] {
  const reach = value === 0 ? 1 : Math.abs(value) * 0.1;
  return [value - reach, value + reach];
}

function stepFor(rough: number, angle: boolean): number {
  if (angle) return angularSteps.find((step) => step >= rough * (1 - 1e-9)) ?? Math.ceil(rough / 360) * 360;
  const decade = 10 ** Math.floor(Math.log10(rough));
  return clean(decimalSteps.find((m) => m * decade >= rough * (1 - 1e-9))! * decade);
}

/** 0.30000000000000004 → 0.3, −0 → 0. */
const clean = (value: number) => Number(value.toPrecision(12)) + 0;
