import { describe, expect, it } from "vitest";
import { deviationsFor, shareBeyond } from "#lib/circuit/numeric/gaussianTail.ts";
import { expectPrinted, expectRelative } from "../support/approx.ts";
import { worked } from "../support/published.ts";

/** 2·scipy.stats.norm.sf(z) of scipy 1.10.1, each to its last digit. */
const tails = [
  [0.01, 0.9920212873707368],
  [0.5, 0.6170750774519738],
  [1, 0.31731050786291415],
  [1.41, 0.15853968290678477],
  [1.42, 0.15560768105309275],
  [2, 0.04550026389635839],
  [2.8, 0.005110260660855864],
  [2.83, 0.004654800413463103],
  [3, 0.0026997960632601866],
  [4, 6.334248366623973e-5],
  [6, 1.973175290075389e-9],
  [10, 1.523970604832094e-23],
  [20, 5.507248237212311e-89],
] as const;

describe("the tails of a Gaussian", () => {
  it.each(tails)("beyond %d deviations agree with scipy", (z, share) => {
    // Far out the rounding of z²/2 itself costs digits.
    expectRelative(shareBeyond(z), share, 1e-14 + z * z * 2.2e-16, `beyond ${z}`);
  });

  it("give the shares that the trade goes by", () => {
    expectPrinted(shareBeyond(3), worked("nz.exceed_3s"), "three");
    expectPrinted(shareBeyond(4), worked("nz.exceed_4s"), "four");
  });

  it("are inverted", () => {
    for (const share of [0.9, 0.1, 1e-3, 1e-9, 1e-100])
      expectRelative(shareBeyond(deviationsFor(share)), share, 1e-10, `${share}`);
    expectPrinted(2 * deviationsFor(1e-3), worked("nz.pp999"), "99.9 % peak to peak");
    expect(shareBeyond(0)).toBe(1);
  });
});
