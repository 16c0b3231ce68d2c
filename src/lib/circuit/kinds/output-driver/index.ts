import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { inverting } from "./topologies/inverting.ts";
import { nonInverting } from "./topologies/nonInverting.ts";

export const outputDriver = defineStageKind({
  id: "output-driver",
  name: "Output driver",
  summary: "Brings the sum to rack level with headroom, through a resistor that protects it.",
  place: "audio",
  ports: [
    { id: "in", label: "audio in", sort: "audio", direction: "in" },
    { id: "out", label: "jack", sort: "audio", direction: "out", jack: true },
  ],
  topologies: [inverting, nonInverting],
  telling: ["gain", "headroomDb"],
  reference,
  version: 1,
});
