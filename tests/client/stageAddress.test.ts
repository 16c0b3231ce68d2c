import { describe, expect, it } from "vitest";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { readAddress, writeAddress } from "#lib/wire/stageAddress.ts";
import { startingState } from "#lib/wire/stageState.ts";

const topologies = stageKinds.flatMap((kind) =>
  kind.topologies.map((topology) => ({ name: `${kind.id}/${topology.id}`, kind, topology })),
);

describe.each(topologies)("address of $name", ({ kind, topology }) => {
  const read = (query: string) => readAddress(kind.topologies, new URLSearchParams(query));
  const bare = `t=${topology.id}`;

  it("opens with the starting design, which needs no words", () => {
    const { state, faults } = read(bare);
    expect(faults).toEqual([]);
    expect(state).toEqual(startingState(topology));
  });

  it("brings back every value that was written, to the last digit", () => {
    const state = structuredClone(startingState(topology));
    for (const key of Object.keys(state.parts)) state.parts[key] = state.parts[key]! * 1.2345678901;
    for (const key of Object.keys(state.targets)) {
      state.targets[key] = state.targets[key]! * 1.01;
      state.windows[key] = 0.035;
    }
    for (const [key, field] of Object.entries(topology.conditions)) {
      if (field.type === "choice") state.conditions[key] = field.options.at(-1)!.value;
      else state.conditions[key] = field.suggestion ?? (field.least + 2 * field.most) / 3;
    }
    state.series = { resistor: "E96", capacitor: "E6" };
    const back = read(writeAddress(topology, state));
    expect(back.faults).toEqual([]);
    expect(back.state).toEqual(state);
    expect(back.topology).toBe(topology);
  });

  it("keeps the usual value for what it cannot take, and says which", () => {
    for (const [key, field] of Object.entries(topology.parts)) {
      for (const bad of ["rubbish", "1e300", "-4k7", "NaN", "4,7k"]) {
        const { state, faults } = read(`${bare}&${key}=${encodeURIComponent(bad)}`);
        expect(state.parts).toEqual(startingState(topology).parts);
        expect(faults.join()).toContain(field.label.slice(1));
      }
    }
  });

  it("leaves parts alone that were given with targets", () => {
    const start = startingState(topology);
    const target = Object.keys(start.targets)[0];
    const part = Object.keys(start.parts)[0];
    if (target === undefined || part === undefined) return;
    const asked = new URLSearchParams(writeAddress(topology, start));
    asked.set(target, String(start.targets[target]! * 1.3));
    expect(read(asked.toString()).state.parts).toEqual(start.parts);
  });

  it("says what it does not know", () => {
    expect(read(`${bare}&zzz=4k7`).faults.join()).toContain("zzz");
  });
});

describe("an address with an unknown topology", () => {
  it("opens the first one and says so", () => {
    const { topology, faults } = readAddress(stageKinds[0]!.topologies, new URLSearchParams("t=no-such"));
    expect(topology).toBe(stageKinds[0]!.topologies[0]);
    expect(faults[0]).toContain("no-such");
  });
});

describe("an address with targets alone", () => {
  const kind = stageKinds.find(({ topologies: [first] }) => Object.keys(first!.targets).length > 0)!;
  const topology = kind.topologies[0]!;

  it("works parts out for them, in values that exist", () => {
    const start = startingState(topology);
    const [key, target] = Object.entries(start.targets)[0]!;
    const { state } = readAddress(kind.topologies, new URLSearchParams(`t=${topology.id}&${key}=${target * 1.5}`));
    expect(state.targets[key]).toBeCloseTo(target * 1.5);
    expect(state.parts).not.toEqual(start.parts);
  });

  it("is written with the letters people type", () => {
    const query = writeAddress(topology, startingState(topology));
    expect(query).not.toContain("%");
    expect(query.length).toBeLessThan(300);
  });
});
