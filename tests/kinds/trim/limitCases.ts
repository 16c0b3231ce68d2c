import type { Change, LimitCase } from "../../support/limitCase.ts";

/** 300 to 700 µA from 7.8 V. */
const window = { least: 11142.857, most: 26e3 };
const original = { rFixed: 4.7e3, rPot: 100e3 };
const revalued = { rFixed: 8.2e3, rPot: 25e3 };
const voltages = { least: 0.35, most: 0.65 };
const unpadded = { rTop: 0, rBottom: 0 };

const rheostat = (code: string, raised: Change, quiet: Change): LimitCase => ({
  topology: "rheostat",
  code,
  raised: { targets: window, ...raised },
  quiet: { targets: window, ...quiet },
});
const divider = (code: string, raised: Change, quiet: Change): LimitCase => ({
  topology: "divider",
  code,
  raised: { targets: voltages, ...raised },
  quiet: { targets: voltages, ...quiet },
});

const current = { conditions: { controlVoltage: 7.8 } };

export const limitCases: readonly LimitCase[] = [
  rheostat("little-travel", { parts: original }, { parts: revalued }),
  rheostat("too-sensitive", { parts: original, ...current }, { parts: revalued, ...current }),
  rheostat("window-not-covered", { parts: { ...revalued, rPot: 20e3 } }, { parts: revalued }),
  rheostat("centre-off", { parts: original }, { parts: revalued }),
  rheostat("end-unsafe", { parts: original, ...current }, { parts: revalued, ...current }),
  divider("little-travel", { parts: unpadded }, { parts: {} }),
  divider("too-sensitive", { parts: { rTop: 0, rBottom: 100 }, targets: { least: 0.13, most: 0.2 } }, {}),
  divider("window-not-covered", { parts: {} }, { parts: { rTop: 300e3, rPot: 15e3, rBottom: 8.2e3 } }),
  divider("centre-off", { parts: unpadded }, { parts: {} }),
  divider("end-unsafe", { conditions: { mostVoltage: 0.65 } }, { conditions: { mostVoltage: 0.8 } }),
  divider("wiper-loaded", { conditions: { loadResistance: 100e3 } }, { conditions: { loadResistance: 10e6 } }),
];
