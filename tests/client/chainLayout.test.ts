import fc from "fast-check";
import { expect, test } from "vitest";
import { boxSize, placeBoxes } from "../../src/components/chain/layout.ts";

/** Links only lead to later boxes, so that no circle closes. */
const chains = fc.integer({ min: 1, max: 40 }).chain((count) =>
  fc.record({
    lanes: fc.array(fc.constantFrom("upper" as const, "lower" as const), { minLength: count, maxLength: count }),
    links: fc.array(fc.tuple(fc.nat(count - 1), fc.nat(count - 1)), { maxLength: 2 * count }),
  }),
);

test("boxes never overlap, links lead to the right, and the lanes stay apart", () => {
  fc.assert(
    fc.property(chains, ({ lanes, links }) => {
      const boxes = lanes.map((lane, index) => ({ id: String(index), lane }));
      const forward = links.filter(([a, b]) => a < b).map(([a, b]) => ({ from: String(a), to: String(b) }));
      const places = placeBoxes(boxes, forward);
      const at = new Map(places.map((place) => [place.id, place]));
      for (const { from, to } of forward) expect(at.get(to)!.x).toBeGreaterThan(at.get(from)!.x);
      const overlapping = places.flatMap((one, index) =>
        places
          .slice(index + 1)
          .filter((other) => Math.abs(one.x - other.x) < boxSize.width && Math.abs(one.y - other.y) < boxSize.height),
      );
      expect(overlapping).toEqual([]);
      const rows = (lane: string) => boxes.filter((box) => box.lane === lane).map(({ id }) => at.get(id)!.y);
      expect(Math.max(-1, ...rows("upper"))).toBeLessThan(Math.min(Infinity, ...rows("lower")));
    }),
    { numRuns: 60 },
  );
});
