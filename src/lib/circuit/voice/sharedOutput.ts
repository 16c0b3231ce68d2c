import { scaledMix, type AudioSignal, type Demand, type Signal } from "../stage/signal.ts";

/** Ω that several inputs load an output with; undefined where none does. */
export function loadOf(demands: readonly Demand[]): number | undefined {
  const conductance = demands.reduce((sum, { resistance }) => sum + (resistance === undefined ? 0 : 1 / resistance), 0);
  return conductance > 0 ? 1 / conductance : undefined;
}

/**
 * An output as one of its inputs sees it: the others load it, so that there is less of it, from a lower resistance
 * (Thévenin). Sound alone carries its source's resistance along; other signals are given as they are under load.
 */
export function behindLoad(signal: Signal | undefined, load: number | undefined): Signal | undefined {
  if (signal?.sort !== "audio" || load === undefined || signal.resistance === 0) return signal;
  const share = load / (load + signal.resistance);
  return { ...scaled(signal, share), resistance: signal.resistance * share };
}

/** What stands at the output itself, all its inputs loading it. */
export function underLoad(signal: AudioSignal, load: number | undefined): AudioSignal {
  return load === undefined ? signal : scaled(signal, load / (load + signal.resistance));
}

const scaled = (signal: AudioSignal, share: number): AudioSignal => ({
  ...signal,
  ...{ rms: signal.rms * share, floor: signal.floor * share, mix: scaledMix(signal.mix, share) },
  ...(signal.clip !== undefined && { clip: signal.clip * share }),
});
