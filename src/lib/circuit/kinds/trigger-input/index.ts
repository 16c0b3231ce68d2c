import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { comparator } from "./topologies/comparator/index.ts";
import { transistorThreshold } from "./topologies/transistor-threshold/index.ts";

export const triggerInput = defineStageKind({
  id: "trigger-input",
  name: "Trigger input",
  summary: "Turns a gate, a slow edge or a button into one pulse, and scales the envelope's peak with velocity.",
  place: "trigger and control",
  ports: [
    { id: "in", label: "trigger in", sort: "trigger", direction: "in", jack: true },
    { id: "velocity", label: "velocity in", sort: "control", direction: "in", jack: true },
    { id: "out", label: "pulse out", sort: "trigger", direction: "out" },
  ],
  topologies: [transistorThreshold, comparator],
  telling: ["threshold", "pulseWidth"],
  reference,
  version: 1,
});
