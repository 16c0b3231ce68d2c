import type { ReferenceCase } from "../../stage/kind.ts";

const computed = {
  title: "Worked values of the trade brief, computed apart from this library",
  place: "tests/reference/worked.json, trim",
  howKnown: "computed",
} as const;

/** Values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "rheostat-revalued",
    topology: "rheostat",
    given: { parts: { rFixed: 8.2e3, rPot: 25e3 }, conditions: { controlVoltage: 7.8 } },
    expect: { spanDb: 12.146485, leastCurrent: 234.93976e-6, mostCurrent: 951.21951e-6 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "rheostat-sized",
    topology: "rheostat",
    given: { targets: { least: 8.2e3, most: 33.2e3 } },
    expect: { rFixed: 8.2e3, rPot: 25e3 },
    tolerance: 1e-9,
    source: computed,
  },
  {
    id: "divider-sized",
    topology: "divider",
    given: { targets: { least: 0.35, most: 0.65 }, parts: { rPot: 10e3 }, conditions: { referenceVoltage: 12 } },
    expect: { rBottom: 11.666667e3, rTop: 378.33333e3 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "divider-in-series-values",
    topology: "divider",
    given: { parts: { rTop: 390e3, rPot: 10e3, rBottom: 12e3 } },
    expect: { endLow: 0.34951456, endHigh: 0.6407767, slopePerDegree: 1.0787487e-3 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "loaded-divider",
    topology: "divider",
    given: {
      parts: { rTop: 1e3, rPot: 2e3, rBottom: 0 },
      conditions: { rotation: 1, referenceVoltage: 10, loadResistance: 100e3 },
    },
    expect: { value: 6.623 },
    tolerance: 1e-4,
    source: {
      title: "Open encyclopedia, Potentiometer",
      place: "theory of operation: 6.623 V with a load, 6.667 V without",
      howKnown: "read",
    },
    note: "The printed result was read; the resistors of 1 kΩ and 2 kΩ, the load of 100 kΩ and the 10 V are from memory.",
  },
  {
    id: "heavily-loaded-pot",
    topology: "divider",
    given: {
      parts: { rTop: 0, rPot: 1e6, rBottom: 0 },
      conditions: { rotation: 0.5, referenceVoltage: 10, loadResistance: 100 },
    },
    expect: { value: 2e-3 },
    tolerance: 1e-3,
    source: {
      title: "RealNfo, Electrical Circuit Analysis",
      place: "Potentiometer Loading, 1 MΩ at mid-travel into 100 Ω: 2 mV of 10 V",
      howKnown: "read",
    },
    note: "Exactly 1.9992 mV.",
  },
];
