import { budgetOf, computeChain, supplyConditions, supplyOf, type BudgetEntry } from "#lib/circuit/voice/index.ts";
import { describe, expect, test } from "vitest";
import { worked } from "../../support/published.ts";
import { find, stageOf, twoPaths } from "../../support/chains.ts";

/** Four dual op amps, one dual amplifier cell at 0.5 mA and noise bias, as the worked set has them, built of stages. */
const stages = [
  ...Array.from({ length: 7 }, (_, index) => stageOf(`f${index}`, "band-pass", "multiple-feedback")),
  stageOf("cell", "ota-cell", "transimpedance", { conditions: { biasCurrent: 500e-6 } }),
];
const noiseBias: BudgetEntry = {
  label: "noise bias",
  positive: { typical: worked("sup.nz_mA") / 1e3, most: worked("sup.nz_mA") / 1e3 },
  negative: { typical: 0, most: 0 },
};
const close = (value: number, key: string, tolerance = 1e-7) =>
  expect(Math.abs(value / worked(key) - 1), `${key}: ${value}`).toBeLessThan(tolerance);

describe("the worked set of the supply", () => {
  const voice = computeChain({ stages, links: [], conditions: {} }, find);
  const own = supplyOf(voice);
  const budget = budgetOf([...own.entries, noiseBias], [], supplyConditions({}));

  test("comes out rail by rail", () => {
    close(budget.positive.typical * 1e3, "sup.pos_typ_mA");
    close(budget.positive.most * 1e3, "sup.pos_max_mA");
    close(budget.negative.typical * 1e3, "sup.neg_typ_mA");
    close(budget.negative.most * 1e3, "sup.neg_max_mA");
    close(budget.positive.windowLow * 1e3, "sup.win_lo_mA");
    close(budget.positive.windowHigh * 1e3, "sup.win_hi_mA");
    close(budget.negative.windowLow * 1e3, "sup.nwin_lo_mA");
    close(budget.negative.windowHigh * 1e3, "sup.nwin_hi_mA");
    close(budget.difference * 1e3, "sup.diff_mA");
    close(budget.limit * 1e3, "sup.limit_mA");
    close(budget.power * 1e3, "sup.P_mW");
  });

  test("with its series elements", () => {
    close(budget.positive.drop * 1e3, "sup.drop_10R_mV");
    close(budget.corner!, "sup.fc_Hz");
    const both = budgetOf(budget.entries, [], supplyConditions({ seriesElement: "schottky-and-resistor" }));
    close(both.positive.left, "sup.rail_schottky");
  });

  test("sags by what charges an envelope", () => {
    const pulse = {
      current: worked("sup.droop_noR_V") * (10e-6 / 1e-3),
      timeConstant: 470e-6,
      width: 1e-3,
      charge: worked("sup.charge_uC") * 1e-6,
    };
    const bare = budgetOf([], [pulse], supplyConditions({ seriesElement: "none" })).droop;
    close(bare.limit, "sup.droop_noR_V");
    close(bare.byCharge, "sup.droop_charge_V");
    expect(bare.actual).toBe(bare.byCharge);
    // The worked set takes the first current of a fixed drop here, and integrates the diode's own law: 4 % apart.
    const { droop } = budgetOf([], [pulse], supplyConditions({}));
    close(droop.limit, "sup.droop_lim_V", 5e-3);
    close(droop.actual * 1e3, "sup.droop_ode_mV", 1e-2);
  });
});

describe("over a voice", () => {
  test("converters count in the most alone, bias currents on both rails, packages whole", () => {
    const { entries } = supplyOf(computeChain(twoPaths(), find));
    const entry = (label: string) => entries.find((one) => one.label.includes(label))!;
    expect(entry("converter").positive.typical).toBe(0);
    expect(entry("converter").positive.most).toBeGreaterThan(100e-6);
    expect(entry("cell: bias").positive).toEqual(entry("cell: bias").negative);
    // Two buffers, band-pass, converter, cell's op amp, sum and driver: seven, so four packages of two.
    expect(entry("op amp").label).toMatch(/^4 × JFET/);
    expect(entry("op amp").positive.typical).toBeCloseTo(8 * 1.4e-3, 12);
  });

  test("the droop of two envelopes is that of one and that of the other", () => {
    const both = supplyOf(computeChain(twoPaths(), find)).droop.actual;
    const chain = twoPaths();
    const less = { ...chain, links: chain.links.filter(({ to }) => to.stage !== "snap") };
    const alone = supplyOf(
      computeChain(
        {
          ...less,
          stages: less.stages.filter(({ id }) => id !== "snap"),
          links: less.links.filter(({ from }) => from.stage !== "snap"),
        },
        find,
      ),
    );
    expect(both).toBeGreaterThan(1.8 * alone.droop.actual);
  });
});
