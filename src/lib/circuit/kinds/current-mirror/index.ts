import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { degenerated } from "./topologies/degenerated.ts";
import { simple } from "./topologies/simple.ts";
import { wilson } from "./topologies/wilson.ts";

export const currentMirror = defineStageKind({
  id: "current-mirror",
  name: "Current mirror",
  summary: "Turns a current drawn from above into one that flows down into a bias pin, and scales or copies it.",
  place: "trigger and control",
  ports: [
    { id: "in", label: "reference current", sort: "bias", direction: "in" },
    { id: "out", label: "copy", sort: "bias", direction: "out" },
  ],
  topologies: [simple, degenerated, wilson],
  telling: ["outputCurrent", "ratioError"],
  reference,
  version: 1,
});
