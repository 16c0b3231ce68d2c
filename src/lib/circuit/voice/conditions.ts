import { common } from "../stage/commonConditions.ts";
import { choice, condition } from "../stage/fields.ts";

/** What holds for a whole voice. A stage that takes a condition of the same name takes it from here. */
export const voiceConditions = {
  temperature: common.temperature,
  railPositive: common.railPositive,
  railNegative: common.railNegative,
  seriesElement: choice({
    label: "Series element of each rail",
    symbol: "",
    default: "resistor",
    options: [
      { value: "none", label: "none" },
      { value: "resistor", label: "a resistor" },
      { value: "schottky", label: "a Schottky diode" },
      { value: "schottky-and-resistor", label: "a Schottky diode and a resistor" },
    ],
  }),
  seriesResistance: condition({
    label: "Series resistor",
    symbol: "R_s",
    unit: "Ω",
    default: 10,
    least: 1,
    most: 100,
    accepts: [0, 1e4],
  }),
  bulkCapacitance: condition({
    label: "Bulk capacitor of each rail",
    symbol: "C_b",
    unit: "F",
    default: 10e-6,
    least: 1e-6,
    most: 470e-6,
    accepts: [1e-9, 1],
  }),
  groundLoads: condition({
    label: "Lamps and other loads from the positive rail to ground",
    symbol: "I_g",
    unit: "A",
    default: 1e-3,
    least: 0,
    most: 50e-3,
    accepts: [0, 1],
    help: "Besides those that stages name themselves.",
  }),
  currentAllowance: condition({
    label: "Current allowance of a rail",
    symbol: "I_most",
    unit: "A",
    default: null,
    least: 10e-3,
    most: 200e-3,
    suggestion: 50e-3,
    help: "What the brief leaves the module.",
  }),
  header: choice({
    label: "Power header",
    symbol: "",
    default: "keyed",
    options: [
      { value: "keyed", label: "keyed shroud" },
      { value: "open", label: "open pins" },
    ],
  }),
} as const;

/** Of those, what stages take under the same name. */
export const sharedConditions = ["temperature", "railPositive", "railNegative"] as const;
