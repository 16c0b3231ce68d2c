import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { resistorLoad } from "./topologies/resistor-load.ts";
import { transimpedance } from "./topologies/transimpedance.ts";

export const otaCell = defineStageKind({
  id: "ota-cell",
  name: "Transconductance cell",
  summary: "Multiplies the sound by the envelope's current: the gain follows the bias current in proportion.",
  place: "audio",
  ports: [
    { id: "in", label: "audio in", sort: "audio", direction: "in" },
    { id: "bias", label: "bias current", sort: "bias", direction: "in" },
    { id: "out", label: "audio out", sort: "audio", direction: "out" },
  ],
  topologies: [transimpedance, resistorLoad],
  telling: ["gainDb", "ceiling"],
  reference,
  version: 1,
});
