import type { ResultValues } from "../../stage/values.ts";
import type { trimResults } from "./fields.ts";
import {
  cornerEnds,
  rotationFor,
  slopeAt,
  valueAt,
  worstCaseMargin,
  type Knob,
  type Setting,
  type Window,
} from "./model.ts";

type R = ReturnType<typeof trimResults<"">>;

/** The window of the targets given, its sides in order; undefined unless both are. */
export function windowOf(wanted: { least?: number; most?: number } = {}): Window | undefined {
  const { least, most } = wanted;
  if (least === undefined || most === undefined) return undefined;
  return { least: Math.min(least, most), most: Math.max(least, most) };
}

/**
 * Every figure of a knob. Without a window its whole range counts as wanted.
 *
 * @param middle what counts as the middle between two values
 */
export function trimFigures(
  setting: Setting,
  knob: Knob,
  window: Window | undefined,
  middle: (a: number, b: number) => number,
): ResultValues<R> {
  const [endLow, endHigh] = [valueAt(setting, knob, 0), valueAt(setting, knob, 1)];
  const { least, most } = window ?? { least: endLow, most: endHigh };
  const usefulRotation = rotationFor(setting, knob, most) - rotationFor(setting, knob, least);
  const centreValue = middle(least, most);
  const centre = rotationFor(setting, knob, centreValue);
  const slope = slopeAt(setting, knob, centre) / knob.electricalAngle;
  // Where the window lies beyond the travel, its centre is the end that is nearest.
  const share = slope / valueAt(setting, knob, centre);
  const corners = cornerEnds(setting, knob);
  return {
    value: valueAt(setting, knob, knob.rotation),
    endLow,
    endHigh,
    ...(endLow > 0 && { spanDb: 20 * Math.log10(endHigh / endLow) }),
    usefulRotation,
    usefulDegrees: usefulRotation * knob.electricalAngle,
    centre,
    centreDegrees: centre * knob.electricalAngle,
    slopePerDegree: slope,
    ...(share < Infinity && {
      sensitivityPerDegree: share,
      sensitivityDb: (20 / Math.LN10) * share,
      sensitivityCents: (1200 / Math.LN2) * share,
    }),
    ...corners,
    ...(window && { worstCaseMargin: worstCaseMargin(corners.worstLow, corners.worstHigh, window) }),
  };
}
