import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { divider } from "./topologies/divider.ts";
import { rheostat } from "./topologies/rheostat.ts";

export const trim = defineStageKind({
  id: "trim",
  name: "Trim and panel pot",
  summary: "Makes the useful part of a control fill its rotation, and still cover it on the worst unit.",
  place: "trigger and control",
  ports: [
    { id: "in", label: "in", sort: "control", direction: "in", mayStayOpen: true },
    { id: "out", label: "out", sort: "control", direction: "out", mayStayOpen: true },
    { id: "soundIn", label: "sound in", sort: "audio", direction: "in", mayStayOpen: true },
    { id: "soundOut", label: "sound out", sort: "audio", direction: "out", mayStayOpen: true },
  ],
  topologies: [rheostat, divider],
  telling: ["usefulDegrees", "centre"],
  reference,
  version: 1,
});
