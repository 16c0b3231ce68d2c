import { correlationOf, crestOf, type AudioSignal } from "../stage/signal.ts";
import type { ComputedChain } from "./compute.ts";
import { loadOf, underLoad } from "./sharedOutput.ts";

/** The level at one point of a voice, at the peak of a hit. */
export interface Level {
  /** "stage.port", or "stage.port: where" for a point inside the stage. */
  node: string;
  /** Id of the stage. */
  stage: string;
  label: string;
  signal: AudioSignal["signal"];
  /** V. */
  rms: number;
  /** V: four standard deviations of noise, the crest of a sine. */
  peak: number;
  /** V to either side; absent where nothing limits it. */
  clip?: number;
  headroomDb?: number;
  /** V RMS of noise between hits. */
  floor: number;
  /** Against the wave it goes with most. */
  sign: 1 | -1;
  /** Id of the stage whose wave that is. */
  origin?: string;
  /** V RMS that the trade allows at this point. */
  most?: number;
  /** What the voice gives to the rack. */
  jack: boolean;
}

/** Every point of a voice that carries sound, in the order of the signal. */
export function levelsOf(computed: ComputedChain): Level[] {
  return computed.order.flatMap((id) => {
    const found = computed.stages.get(id);
    if (!found) return [];
    const ports = found.found.kind.ports;
    return Object.entries(found.gives).flatMap(([port, signal]): Level[] => {
      if (signal?.sort !== "audio") return [];
      const node = `${id}.${port}`;
      const jack = ports.some((one) => one.id === port && one.jack) && computed.wiring.fedBy(id, port).length === 0;
      const crest = crestOf[signal.signal];
      const inner = (signal.inside ?? []).map(({ label, rms, most }): Level => ({
        ...{ node: `${node}: ${label}`, stage: id, label: `${found.stage.name}, ${label}`, signal: signal.signal },
        ...{ rms, peak: rms * crest, floor: 0, sign: 1, most, jack: false },
      }));
      const load = loadOf(
        computed.wiring.fedBy(id, port).map((end) => computed.stages.get(end.stage)?.asks[end.port] ?? {}),
      );
      return [...inner, { ...levelOf(underLoad(signal, load)), node, stage: id, label: found.stage.name, jack }];
    });
  });
}

function levelOf({ signal, rms, floor, clip, mix }: AudioSignal) {
  const peak = rms * crestOf[signal];
  const [origin, part] = Object.entries(mix).sort(([, a], [, b]) => Math.abs(b) - Math.abs(a))[0] ?? [];
  return {
    ...{ signal, rms, peak, floor, sign: (part !== undefined && part < 0 ? -1 : 1) as 1 | -1 },
    ...(clip !== undefined && { clip }),
    ...(clip !== undefined && clip > 0 && peak > 0 && { headroomDb: 20 * Math.log10(clip / peak) }),
    ...(origin !== undefined && { origin }),
  };
}

/** The point that clips first as everything grows louder; undefined where nothing limits anything. */
export function firstToClip(levels: readonly Level[]): Level | undefined {
  return levels.reduce<Level | undefined>(
    (first, level) =>
      level.headroomDb !== undefined && level.headroomDb < (first?.headroomDb ?? Infinity) ? level : first,
    undefined,
  );
}

/** Two paths that meet in a stage. */
export interface Meeting {
  /** Id of the stage, and its two inputs. */
  stage: string;
  ports: readonly [string, string];
  /** −1 to 1, as the two arrive. */
  correlation: number;
  /** dB that the pair gains or loses against the same levels with the other parity. */
  parityDb: number;
  /** Both go back to one source, through filters that shaped them apart; their correlation is taken as none. */
  commonAncestor: boolean;
}

/** Every pair of sounds that meet, with what their signs make of them. */
export function meetingsOf(computed: ComputedChain): Meeting[] {
  return [...computed.stages].flatMap(([id, { inputs }]) => {
    const sounds = Object.entries(inputs).flatMap(([port, signal]) =>
      signal?.sort === "audio" ? [{ port, signal }] : [],
    );
    return sounds.flatMap((one, index) =>
      sounds.slice(index + 1).map((other): Meeting => {
        const correlation = correlationOf(one.signal, other.signal);
        const [a, b] = [one.signal.rms, other.signal.rms];
        const power = (rho: number) => a * a + b * b + 2 * rho * a * b;
        const least = Math.max(power(-correlation), 1e-24 * (a * a + b * b));
        return {
          ...{ stage: id, ports: [one.port, other.port], correlation },
          parityDb:
            a === 0 && b === 0 ? 0 : 10 * Math.log10(Math.max(power(correlation), 1e-24 * (a * a + b * b)) / least),
          commonAncestor: correlation === 0 && shareAncestor(computed, one.signal, other.signal),
        };
      }),
    );
  });
}

function shareAncestor(computed: ComputedChain, one: AudioSignal, other: AudioSignal): boolean {
  const roots = (signal: AudioSignal) =>
    new Set(Object.keys(signal.mix).flatMap((origin) => upstream(computed, origin)));
  const left = roots(one);
  return [...roots(other)].some((id) => left.has(id));
}

/** A stage and all whose sound reaches it. */
function upstream(computed: ComputedChain, id: string, seen = new Set<string>()): string[] {
  if (seen.has(id)) return [];
  seen.add(id);
  const inputs = computed.stages.get(id)?.inputs ?? {};
  const sources = Object.entries(inputs).flatMap(([port, signal]) =>
    signal?.sort === "audio" ? (computed.wiring.sourceOf(id, port)?.stage ?? []) : [],
  );
  return [id, ...sources.flatMap((source) => upstream(computed, source, seen))];
}
