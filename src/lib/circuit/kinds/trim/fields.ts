import { common } from "../../stage/commonConditions.ts";
import { choice, condition, type ResultField } from "../../stage/fields.ts";
import type { Unit } from "../../quantity/units.ts";
import { perCent } from "../../stage/shown.ts";

/** The knob and its tolerances; every topology takes these. */
export const conditions = {
  potLaw: choice({
    label: "Pot law",
    symbol: "a(x)",
    default: "linear",
    options: [
      { value: "linear", label: "linear" },
      { value: "logarithmic", label: "logarithmic" },
      { value: "reverse-logarithmic", label: "reverse logarithmic" },
    ],
  }),
  lawShape: choice({
    label: "Shape of a logarithmic law",
    symbol: "",
    default: "curve",
    options: [
      { value: "curve", label: "smooth" },
      { value: "two-segment", label: "two straight segments, as printed tracks are" },
    ],
  }),
  midFraction: condition({
    label: "Share of the track at mid-travel",
    symbol: "m",
    unit: "",
    default: 0.15,
    least: 0.1,
    most: 0.2,
    accepts: [0.01, 0.49],
    scale: "linear",
    help: "Of a logarithmic law; measure it, since the letters of makers contradict each other.",
  }),
  rotation: common.rotation,
  electricalAngle: condition({
    label: "Electrical travel",
    symbol: "θ",
    unit: "°",
    default: 270,
    least: 260,
    most: 280,
    accepts: [30, 3600],
    scale: "linear",
  }),
  endResistance: condition({
    label: "Left over at the pot's end",
    symbol: "e",
    unit: "",
    default: 0,
    least: 0,
    most: 0.02,
    accepts: [0, 0.2],
    suggestion: 0.01,
    help: "As a share of the track.",
  }),
  resistorTolerance: common.resistorTolerance,
  potTolerance: common.potTolerance,
} as const;

/** Results of both topologies, in the unit of what is set. */
export const trimResults = <const U extends Unit>(unit: U) =>
  ({
    value: { label: "As set", symbol: "y", unit, formula: "value", help: "At the rotation given." },
    endLow: { label: "At the low end", symbol: "y_0", unit, formula: "value" },
    endHigh: { label: "At the high end", symbol: "y_1", unit, formula: "value" },
    spanDb: { label: "Span", symbol: "S", unit: "dB", formula: "span" },
    usefulRotation: {
      label: "Useful rotation",
      symbol: "Δx",
      unit: "",
      shown: perCent,
      formula: "useful",
      help: "Of the travel, between the least and the most wanted; all of it where nothing is.",
    },
    usefulDegrees: { label: "Useful rotation", symbol: "Δθ", unit: "°", formula: "useful" },
    centre: {
      label: "Centre of the window",
      symbol: "x_c",
      unit: "",
      shown: perCent,
      formula: "centre",
      help: "Where on the travel the middle of the window lies.",
    },
    centreDegrees: { label: "Centre of the window", symbol: "θ_c", unit: "°", formula: "centre" },
    sensitivityPerDegree: {
      label: "Sensitivity, per degree",
      symbol: "s",
      unit: "",
      shown: perCent,
      formula: "sensitivity",
      help: "At the centre of the window.",
    },
    sensitivityDb: { label: "Sensitivity, per degree", symbol: "s", unit: "dB", formula: "sensitivity" },
    sensitivityCents: { label: "Sensitivity, per degree", symbol: "s", unit: "cents/°", formula: "sensitivity" },
    slopePerDegree: { label: "Slope, per degree", symbol: "y'", unit, formula: "sensitivity" },
    worstLow: {
      label: "Low end, worst unit",
      symbol: "y_0,w",
      unit,
      formula: "coverage",
      help: "The highest that the low end may lie.",
    },
    worstHigh: {
      label: "High end, worst unit",
      symbol: "y_1,w",
      unit,
      formula: "coverage",
      help: "The lowest that the high end may lie.",
    },
    extremeLow: { label: "Lowest of any unit", symbol: "y_0,x", unit, formula: "coverage" },
    extremeHigh: { label: "Highest of any unit", symbol: "y_1,x", unit, formula: "coverage" },
    worstCaseMargin: {
      label: "Margin of the worst unit",
      symbol: "M",
      unit: "",
      shown: perCent,
      formula: "coverage",
      help: "By which it still reaches past the window; below zero it does not reach.",
    },
  }) as const satisfies Record<string, ResultField>;
