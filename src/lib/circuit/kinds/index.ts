import type { StageKind } from "../stage/kind.ts";
import { bandPass } from "./band-pass/index.ts";
import { burstEnvelope } from "./burst-envelope/index.ts";
import { currentMirror } from "./current-mirror/index.ts";
import { decayEnvelope } from "./decay-envelope/index.ts";
import { noiseSource } from "./noise-source/index.ts";
import { otaCell } from "./ota-cell/index.ts";
import { outputDriver } from "./output-driver/index.ts";
import { summingNode } from "./summing-node/index.ts";
import { transistorCell } from "./transistor-cell/index.ts";
import { triggerInput } from "./trigger-input/index.ts";
import { trim } from "./trim/index.ts";
import { voltageToCurrent } from "./voltage-to-current/index.ts";

/** Every stage kind, in the order a voice is built. Adding one: its folder and a line here. */
export const stageKinds: readonly StageKind[] = [
  triggerInput,
  decayEnvelope,
  burstEnvelope,
  voltageToCurrent,
  currentMirror,
  noiseSource,
  trim,
  bandPass,
  otaCell,
  transistorCell,
  summingNode,
  outputDriver,
];
