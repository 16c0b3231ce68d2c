import type { Unit } from "../../quantity/units.ts";
import type { Curve } from "../../stage/curve.ts";
import { cornerEnds, valueAt, type Knob, type Setting } from "./model.ts";

/** Degrees on the axis; a pot of another travel differs by a few per cent. From memory. */
const usualAngle = 270;

/** Value over the rotation, as set and with another law, so that the knob's feel is seen. */
export function travelCurve<S extends { conditions: Knob }>(
  settingOf: (state: S) => Setting,
  y: { quantity: string; unit: Unit },
): Curve<S> {
  return {
    id: "travel",
    name: "Value over rotation",
    x: { quantity: "Rotation", unit: "", scale: "linear", shown: { unit: "°", factor: usualAngle } },
    y: { ...y, scale: "linear" },
    domain: () => [0, 1],
    defined: [0, 1],
    lines: (state) => {
      const setting = settingOf(state);
      const at = (knob: Knob) => (x: number) => valueAt(setting, knob, x);
      const { worstLow, worstHigh } = cornerEnds(setting, state.conditions);
      const flat = (id: string, label: string, value: number) => ({ id, label, at: () => value });
      return [
        { id: "now", label: "as set", at: at(state.conditions) },
        ...(state.conditions.potLaw === "linear"
          ? []
          : [{ id: "linear", label: "linear pot", at: at({ ...state.conditions, potLaw: "linear" }) }]),
        flat("worst-low", "low end, worst unit", worstLow),
        flat("worst-high", "high end, worst unit", worstHigh),
      ];
    },
    mark: (state) => ({ x: state.conditions.rotation, label: "as set" }),
    window: ({ least, most }) => {
      if (!least || !most) return undefined;
      const [a, b] = [(least.least + least.most) / 2, (most.least + most.most) / 2];
      return { y: [Math.min(a, b), Math.max(a, b)] };
    },
  };
}
