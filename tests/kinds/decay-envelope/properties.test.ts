import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { chargeOf } from "#lib/circuit/kinds/decay-envelope/model.ts";
import { decayEnvelope } from "#lib/circuit/kinds/decay-envelope/index.ts";
import { analyseStage, plotStage, type PlainConditions, type PlainValues } from "#lib/circuit/index.ts";
import { diodeConductance, diodeCurrent, diodeVoltage, diodeVoltageBehind } from "#lib/circuit/device/diode.ts";
import { integrate } from "#lib/circuit/numeric/integrate.ts";
import { expectRelative } from "../../support/approx.ts";
import { conditionsOf, logarithmic, partsOf, runs } from "../../support/random.ts";

const topology = decayEnvelope.topologies[0]!;
const analyse = (parts: PlainValues, conditions: PlainConditions) =>
  analyseStage(topology, { parts, conditions }).results as Record<string, number>;

const charging = fc.record({
  height: fc.integer({ min: 10, max: 120 }).map((x) => x / 10),
  resistance: logarithmic(10, 10e3),
  capacitance: logarithmic(10e-9, 10e-6),
  diode: fc.record({ saturationCurrent: logarithmic(1e-15, 1e-7), slopeVoltage: logarithmic(0.024, 0.052) }),
});
const discharge = fc.record({ resistance: logarithmic(470, 1e6), rest: fc.constant(0) });
const width = logarithmic(10e-6, 20e-3);

describe("the diode-charged envelope", () => {
  it("takes the time of its pulse to reach its peak: the charge, integrated backwards, gives the width again", () => {
    fc.assert(
      fc.property(charging, discharge, width, (driven, { resistance: r }, tw) => {
        const { diode, resistance: rs, capacitance: c, height } = driven;
        const charge = chargeOf(driven, { resistance: r, rest: 0 }, tw)!;
        // Where the charge has settled, the time cannot be told from the voltage.
        fc.pre(charge.peak < 0.98 * chargeOf(driven, { resistance: r, rest: 0 }, null)!.peak);
        const from = diodeVoltageBehind(diode, rs, height);
        const to = diodeVoltageBehind(diode, rs, height - charge.peak);
        const time = integrate(
          (u) => {
            const i = diodeCurrent(diode, u);
            return (-c * (1 + rs * diodeConductance(diode, u))) / (i - (height - u - rs * i) / r);
          },
          from,
          to,
        );
        expectRelative(time, tw, 1e-7, "width");
      }),
      runs(200),
    );
  });

  it("peaks higher with a longer pulse, and never above what it settles at", () => {
    fc.assert(
      fc.property(charging, discharge, width, (driven, into, tw) => {
        const peaks = [tw, 2 * tw, null].map((w) => chargeOf(driven, into, w)!.peak);
        expect(peaks[1]! - peaks[0]!).toBeGreaterThan(-1e-9);
        expect(peaks[2]! - peaks[1]!).toBeGreaterThan(-1e-9);
      }),
      runs(200),
    );
  });

  it("charges through a steep diode as through a fixed drop of its voltage", () => {
    fc.assert(
      fc.property(charging, discharge, width, (driven, into, tw) => {
        // With n·VT → 0 the drop no longer depends on the current.
        const law = { slopeVoltage: 1e-4, saturationCurrent: 1e-3 * Math.exp(-0.06 / 1e-4) };
        const steep = chargeOf({ ...driven, diode: law }, into, tw)!;
        const fixed = chargeOf({ ...driven, diode: diodeVoltage(law, 1e-3) }, into, tw)!;
        expectRelative(steep.peak, fixed.peak, 5e-3, "peak");
      }),
      runs(100),
    );
  });

  it("decays longer with every resistance and the capacitor, and scales with the capacitor", () => {
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), (parts, conditions) => {
        const before = analyse(parts, conditions);
        for (const key of ["rMin", "rPot", "c"])
          expect(analyse({ ...parts, [key]: parts[key]! * 1.1 }, conditions)["longestDecayTime60"]).toBeGreaterThan(
            before["longestDecayTime60"]!,
          );
        const twice = analyse({ ...parts, c: parts["c"]! * 2 }, conditions);
        expectRelative(twice["decayTime60"], 2 * before["decayTime60"]!, 1e-14, "decay");
      }),
      runs(100),
    );
  });

  it("is heard for as long as its curve says", () => {
    fc.assert(
      fc.property(partsOf(topology), conditionsOf(topology), (parts, conditions) => {
        const { audibleDecayTime60 } = analyse(parts, conditions);
        fc.pre(audibleDecayTime60 !== undefined);
        const at = [audibleDecayTime60! + ((conditions["pulseWidth"] as number | null) ?? 0)];
        const [now] = plotStage(topology, { parts, conditions, curves: ["envelope-db"], at });
        expect(Math.abs(now!.points[0]![1] + 60)).toBeLessThan(1e-5);
      }),
      runs(100),
    );
  });
});
