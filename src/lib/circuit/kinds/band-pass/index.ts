import { defineStageKind } from "../../stage/kind.ts";
import { reference } from "./reference.ts";
import { bridgedT } from "./topologies/bridged-t/index.ts";
import { multipleFeedback } from "./topologies/multiple-feedback/index.ts";
import { passive } from "./topologies/passive/index.ts";
import { sallenKey } from "./topologies/sallen-key/index.ts";
import { twoIntegrator } from "./topologies/two-integrator/index.ts";

export const bandPass = defineStageKind({
  id: "band-pass",
  name: "Band-pass",
  summary: "Gives noise its colour: a centre, a width and a gain, the centre moved a little by one pot.",
  place: "audio",
  ports: [
    { id: "in", label: "audio in", sort: "audio", direction: "in" },
    { id: "strike", label: "strike", sort: "trigger", direction: "in", mayStayOpen: true },
    { id: "out", label: "audio out", sort: "audio", direction: "out" },
  ],
  topologies: [multipleFeedback, sallenKey, twoIntegrator, bridgedT, passive],
  telling: ["centreFrequency", "qualityFactor"],
  reference,
  version: 1,
});
