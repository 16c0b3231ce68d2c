import { electricalAngle } from "../../parts/electricalAngle.ts";
import type { Curve, Line } from "../../stage/curve.ts";
import { magnitudeDbAt, phaseDegrees, type Transfer } from "../../network/transfer.ts";

const frequency = { quantity: "Frequency", unit: "Hz", scale: "logarithmic" } as const;

export interface Companion<S> {
  id: string;
  label: string;
  state: S;
}

/**
 * Magnitude and phase of a band-pass, drawn a decade to either side of its centre.
 *
 * @param transferOf the exact transfer function of a state
 * @param companions further states to draw along: the pot at its ends
 */
export function responseCurves<S>(
  transferOf: (state: S) => Transfer,
  centreOf: (state: S) => number,
  companions: (state: S) => readonly Companion<S>[],
): Curve<S>[] {
  const lines = (state: S, draw: (transfer: Transfer) => (x: number) => number): Line[] => [
    { id: "now", label: "as set", at: draw(transferOf(state)) },
    ...companions(state).map(({ id, label, state: other }) => ({ id, label, at: draw(transferOf(other)) })),
  ];
  const domain = (state: S): readonly [number, number] => roundDecades(centreOf(state));
  const mark = (state: S) => ({ x: centreOf(state), label: "centre" });
  return [
    {
      id: "magnitude",
      name: "Magnitude",
      x: frequency,
      y: { quantity: "Gain", unit: "dB", scale: "linear" },
      domain,
      defined: [Number.MIN_VALUE, Number.MAX_VALUE],
      lines: (state) => lines(state, (transfer) => (x) => magnitudeDbAt(transfer, x)),
      mark,
      window: ({ centreFrequency, peakGain }) => ({
        ...(centreFrequency && { x: [centreFrequency.least, centreFrequency.most] as const }),
        ...(peakGain && { y: [20 * Math.log10(peakGain.least), 20 * Math.log10(peakGain.most)] as const }),
      }),
    },
    {
      id: "phase",
      name: "Phase",
      x: frequency,
      y: { quantity: "Phase", unit: "°", scale: "linear" },
      domain,
      defined: [Number.MIN_VALUE, Number.MAX_VALUE],
      lines: (state) => lines(state, phaseDegrees),
      mark,
    },
  ];
}

/** The centre over the rotation of the retune pot. */
export function retuneCurve<S>(
  centreAt: (state: S, rotation: number) => number,
  rotationOf: (state: S) => number,
): Curve<S> {
  return {
    id: "retune",
    name: "Centre over rotation",
    x: { quantity: "Rotation", unit: "", scale: "linear", shown: { unit: "°", factor: electricalAngle } },
    y: { quantity: "Centre frequency", unit: "Hz", scale: "linear" },
    domain: () => [0, 1],
    defined: [0, 1],
    lines: (state) => [{ id: "now", label: "as set", at: (rotation) => centreAt(state, rotation) }],
    mark: (state) => ({ x: rotationOf(state), label: "as set" }),
    window: ({ centreFrequency }) => centreFrequency && { y: [centreFrequency.least, centreFrequency.most] },
  };
}

/** The pot at its two ends, as companions of a response. */
export function potEnds<S>(atRotation: (rotation: number) => S): Companion<S>[] {
  return [
    { id: "pot-out", label: "pot at 0°", state: atRotation(0) },
    { id: "pot-in", label: `pot at ${electricalAngle}°`, state: atRotation(1) },
  ];
}

/** A decade below to a decade above, on whole 1-2-5 steps, so that the axis does not crawl while a value is turned. */
export function roundDecades(centre: number): readonly [number, number] {
  const step = (value: number) => {
    const decade = 10 ** Math.floor(Math.log10(value));
    return [5, 2, 1].find((m) => value / decade >= m * (1 - 1e-9))! * decade;
  };
  const least = step(centre / 10);
  return [least, least * 100];
}
