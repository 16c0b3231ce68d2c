import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { opAmpTransistor } from "./topologies/op-amp-transistor.ts";
import { resistor } from "./topologies/resistor.ts";

export const voltageToCurrent = defineStageKind({
  id: "voltage-to-current",
  name: "Voltage to current",
  summary: "Turns the envelope's voltage into the current that sets the gain of an amplifier cell.",
  place: "trigger and control",
  ports: [
    { id: "in", label: "control in", sort: "control", direction: "in" },
    { id: "out", label: "current out", sort: "bias", direction: "out" },
  ],
  topologies: [opAmpTransistor, resistor],
  telling: ["outputCurrent", "faultCurrent"],
  reference,
  version: 1,
});
