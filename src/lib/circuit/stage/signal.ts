/** What passes from an output to the inputs it is linked to, and what those ask of it. SI; peaks at the hardest hit. */
export interface TriggerSignal {
  sort: "trigger";
  /** V. */
  height: number;
  /** s; absent where it is not known. */
  width?: number;
}

export interface ControlSignal {
  sort: "control";
  /** V at the peak of a hit. */
  peak: number;
  /** V that it falls back to. */
  rest: number;
  /** Ω. */
  resistance: number;
  /** s of its decay; absent for a voltage that stands. */
  timeConstant?: number;
}

export interface BiasSignal {
  sort: "bias";
  /** A at the peak of a hit. */
  peak: number;
  /** A that it falls back to. */
  rest: number;
}

export interface AudioSignal {
  sort: "audio";
  /** V RMS at the peak of a hit. */
  rms: number;
  signal: "noise" | "sine";
  /** Ω of the output. */
  resistance: number;
  /** Hz: corner of the one pole that limits white noise; absent for what a filter has shaped. */
  bandwidth?: number;
  /** V RMS of noise that is there between hits. */
  floor: number;
  /** V to either side that the output can reach; absent where nothing limits it. */
  clip?: number;
  /** How much of it, in V RMS, goes with the wave of each origin; negative where it is upside down. The rest goes with none. */
  mix: Mix;
  /** Points inside the stage with a limit of their own. */
  inside?: readonly InnerLevel[];
}

export interface InnerLevel {
  label: string;
  /** V RMS. */
  rms: number;
  /** V RMS that the trade allows there. */
  most: number;
}

export type Signal = TriggerSignal | ControlSignal | BiasSignal | AudioSignal;

/** By origin: the id of the stage that first gave that wave. */
export type Mix = Readonly<Record<string, number>>;

/** Stands for the stage itself in a mix; the chain puts the stage's id in its place. */
export const ownOrigin = "";

/** What the inputs on an output do to it. */
export interface Demand {
  /** Ω to ground that they load it with. */
  resistance?: number;
  /** V below which they do nothing. */
  deadBand?: number;
  /** V at which a current is taken up. */
  voltage?: number;
  /** s of the capacitor that they charge through their own resistor. */
  timeConstant?: number;
  /** Ω in the emitter of what takes a current up. */
  degeneration?: number;
}

/** Peaks over RMS: noise is planned for at four standard deviations, beyond which 63 ppm of a Gaussian lie. */
export const crestOf = { noise: 4, sine: Math.SQRT2 } as const;

/** The mix behind a gain, which is negative where the stage inverts; `correlation` falls below one where it bends the wave. */
export function scaledMix(mix: Mix, gain: number, correlation = 1): Mix {
  return Object.fromEntries(Object.entries(mix).map(([origin, part]) => [origin, part * gain * correlation]));
}

/** A wave that no other stage knows: noise of a source, or what a filter has made its own. */
export const ownMix = (rms: number): Mix => ({ [ownOrigin]: rms });

/** Waves added: what shares an origin adds with its sign, everything else by squares. */
export function sumOfWaves(waves: readonly { rms: number; mix: Mix }[]): { rms: number; mix: Mix } {
  const mix: Record<string, number> = {};
  let others = 0;
  for (const wave of waves) {
    others += loosePower(wave);
    for (const [origin, part] of Object.entries(wave.mix)) mix[origin] = (mix[origin] ?? 0) + part;
  }
  const known = Object.values(mix).reduce((sum, part) => sum + part * part, 0);
  return { rms: Math.sqrt(known + others), mix };
}

/** V² that goes with no origin. */
function loosePower({ rms, mix }: { rms: number; mix: Mix }): number {
  const known = Object.values(mix).reduce((sum, part) => sum + part * part, 0);
  return Math.max(0, rms * rms - known);
}

/** The share of two waves that goes together, −1 to 1; 0 where either is silent. */
export function correlationOf(one: { rms: number; mix: Mix }, other: { rms: number; mix: Mix }): number {
  if (one.rms === 0 || other.rms === 0) return 0;
  const shared = Object.entries(one.mix).reduce((sum, [origin, part]) => sum + part * (other.mix[origin] ?? 0), 0);
  return shared / (one.rms * other.rms);
}

/** Inputs on one output, taken together: loads in parallel, the widest dead band, the slowest charge. */
export function joinedDemand(demands: readonly Demand[]): Demand {
  const known = (key: keyof Demand) => demands.flatMap((demand) => demand[key] ?? []);
  const conductance = known("resistance").reduce((sum, resistance) => sum + 1 / resistance, 0);
  const most = (key: keyof Demand) => (known(key).length > 0 ? { [key]: Math.max(...known(key)) } : {});
  return {
    ...(conductance > 0 && { resistance: 1 / conductance }),
    ...most("deadBand"),
    ...most("voltage"),
    ...most("timeConstant"),
    ...most("degeneration"),
  };
}
