import { stageKinds } from "#lib/circuit/kinds/index.ts";
import {
  condition,
  defaultParts,
  defaultTargets,
  defineStageKind,
  defineTopology,
  type PlainConditions,
  type PlainValues,
} from "#lib/circuit/index.ts";
import { ownMix, type AudioSignal } from "#lib/circuit/stage/signal.ts";
import { findIn, type Chain, type ChainLink, type ChainStage } from "#lib/circuit/voice/index.ts";

/** White noise of a level that the test gives, with nothing else to it. */
const source = defineTopology({
  id: "white",
  name: "White noise",
  summary: "",
  parts: {},
  conditions: {
    rms: condition({ label: "Level", symbol: "V", unit: "V", default: 1, least: 0.1, most: 10 }),
    resistance: condition({ label: "Output", symbol: "R", unit: "Ω", default: 0, least: 0, most: 1e6 }),
  },
  targets: {},
  results: { rms: { label: "Level", symbol: "V", unit: "V", formula: "level" } },
  analyse: ({ conditions: { rms } }) => ({ rms }),
  design: () => ({}),
  anchors: [],
  curves: [],
  limits: [],
  formulas: [],
  sources: [],
  network: { width: 1, height: 1, items: [] },
  devices: [],
  joints: {
    out: {
      gives: ({ conditions: { rms, resistance } }): AudioSignal => ({
        sort: "audio",
        rms: rms as number,
        signal: "noise",
        resistance: resistance as number,
        bandwidth: 20e3,
        floor: 0,
        mix: ownMix(rms as number),
      }),
    },
  },
  traits: [],
  leavesOut: [],
});

const noise = defineStageKind({
  id: "test-noise",
  name: "Test noise",
  summary: "",
  place: "audio",
  ports: [{ id: "out", label: "noise out", sort: "audio", direction: "out" }],
  topologies: [source],
  telling: ["rms", "rms"],
  reference: [],
  version: 1,
});

export const find = findIn([...stageKinds, noise]);

/** A stage with its topology's own values, but for those given. */
export function stageOf(
  id: string,
  kind: string,
  topology: string,
  own: { parts?: PlainValues; conditions?: PlainConditions } & Partial<Pick<ChainStage, "apart" | "designators">> = {},
): ChainStage {
  const found = find(kind, topology);
  if (!found) throw new Error(`there is no ${kind}/${topology}`);
  const { parts, conditions, ...rest } = own;
  return {
    id,
    kind,
    topology,
    name: id,
    parts: { ...defaultParts(found.topology), ...parts },
    conditions: { ...conditions },
    targets: defaultTargets(found.topology),
    designators: {},
    ...rest,
  };
}

/** "a.out > b.in" as links, numbered. */
export function linksOf(...texts: string[]): ChainLink[] {
  const end = (text: string) => {
    const [stage = "", port = ""] = text.trim().split(".");
    return { stage, port };
  };
  return texts.map((text, index) => {
    const [from = "", to = ""] = text.split(">");
    return { id: `l${index}`, from: end(from), to: end(to) };
  });
}

/** Two gated paths of one noise: every sort of link, a split and a sum. */
export function twoPaths(change: { cell?: "transimpedance" | "resistor-load" } = {}): Chain {
  return {
    stages: [
      stageOf("trigger", "trigger-input", "transistor-threshold", { conditions: { velocity: 5, velocityGain: 1.9 } }),
      stageOf("envelope", "decay-envelope", "diode-charged", { conditions: { diodeDrop: 0.65, rotation: 0.3 } }),
      stageOf("snap", "decay-envelope", "diode-charged", { conditions: { diodeDrop: 0.65, output: "capacitor" } }),
      stageOf("noise", "test-noise", "white", { conditions: { rms: 5 } }),
      stageOf("amount", "trim", "divider", {
        parts: { rTop: 0, rPot: 50e3, rBottom: 0 },
        conditions: { rotation: 0.7 },
      }),
      stageOf("band", "band-pass", "multiple-feedback", { parts: { ra: 22e3, rb: 3200, rf: 100e3 } }),
      stageOf("converter", "voltage-to-current", "op-amp-transistor"),
      stageOf("mirror", "current-mirror", "degenerated", { conditions: { beta: 150, earlyVoltage: 50 } }),
      stageOf("cell", "ota-cell", change.cell ?? "transimpedance"),
      stageOf("switch", "transistor-cell", "swing"),
      stageOf("sum", "summing-node", "inverting"),
      stageOf("driver", "output-driver", "inverting", { conditions: { loadResistance: 100e3, inputNoise: 18e-9 } }),
    ],
    links: linksOf(
      "trigger.out > envelope.in",
      "trigger.out > snap.in",
      "envelope.out > converter.in",
      "converter.out > mirror.in",
      "mirror.out > cell.bias",
      "snap.out > switch.control",
      "noise.out > amount.soundIn",
      "amount.soundOut > band.in",
      "band.out > cell.in",
      "band.out > switch.in",
      "cell.out > sum.in1",
      "switch.out > sum.in2",
      "sum.out > driver.in",
    ),
    conditions: {},
  };
}
