import { describe, expect, it } from "vitest";
import type { PlainValues } from "#lib/circuit/index.ts";
import { expectRelative } from "../../support/approx.ts";
import { analyseChange } from "../../support/limitCase.ts";
import { committed, itGivesTheCommittedFiguresAgain } from "../../support/scipy.ts";
import { topologyOf } from "./networks.ts";

interface Given {
  topology: string;
  parts: PlainValues;
  rs: number;
  ft: number | null;
  rl?: number;
  strike?: [height: number, width: number];
}

const { cases, versions } = committed<Given, Record<string, number>>("band_pass_networks");

describe(`the other band-pass networks against scipy ${versions["scipy"]}`, () => {
  it.each(cases.map((one) => [one.given.id, one] as const))("agrees for %s", (id, { given, figures }) => {
    const { topology, parts, rs, ft, rl, strike } = given;
    const { results } = analyseChange(topologyOf(topology), {
      parts,
      conditions: {
        sourceResistance: rs,
        ...(topology !== "passive" && { gainBandwidth: ft }),
        ...(rl !== undefined && { loadResistance: rl }),
        ...(strike && { strikeVoltage: strike[0], strikeWidth: strike[1] }),
      },
    });
    const { poleCentre, poleQuality, ...read } = figures;
    expect(Object.keys(read).length).toBeGreaterThanOrEqual(3);
    const wanted =
      topology === "bridged-t" ? { ...read, centreFrequency: poleCentre, qualityFactor: poleQuality } : read;
    // A quadrature over 26 decades has the fewest good digits.
    for (const [key, value] of Object.entries(wanted))
      expectRelative(results[key], value!, key === "noiseBandwidth" ? 2e-9 : 1e-10, `${id} ${key}`);
  });
});

describe("tests/reference/band_pass_networks.py", () => {
  itGivesTheCommittedFiguresAgain("band_pass_networks", 1e-8);
});
