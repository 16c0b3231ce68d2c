import type { PartClass } from "../stage/fields.ts";

/** A sort of part as it is bought: how far it may be off, and how it moves with temperature. */
export interface PartType {
  id: string;
  label: string;
  partClass: PartClass;
  /** Relative, to either side. */
  tolerance: number;
  /** Relative change per kelvin from 25 °C, least and most of any one part; a change "over the range" is spread over 80 K. */
  drift: { least: number; most: number };
}

const either = (drift: number) => ({ least: -drift, most: drift });
const overRange = 80;

/**
 * Typical figures by type: common practice and comparison tables of capacitor makers; the data sheet of the part in hand
 * decides. The first of a class is the one taken where nothing is said.
 */
export const partTypes: readonly PartType[] = [
  { id: "metal-film", label: "metal or thin film", partClass: "resistor", tolerance: 0.01, drift: either(50e-6) },
  { id: "precision-film", label: "precision film", partClass: "resistor", tolerance: 0.001, drift: either(25e-6) },
  { id: "thick-film", label: "thick-film chip", partClass: "resistor", tolerance: 0.01, drift: either(200e-6) },
  { id: "carbon-film", label: "5 % resistor", partClass: "resistor", tolerance: 0.05, drift: either(200e-6) },
  { id: "class-1", label: "class 1 ceramic", partClass: "capacitor", tolerance: 0.05, drift: either(30e-6) },
  {
    id: "polypropylene",
    label: "polypropylene film",
    partClass: "capacitor",
    tolerance: 0.05,
    drift: { least: -0.025 / overRange, most: 0 },
  },
  {
    id: "polyphenylene-sulphide",
    label: "polyphenylene-sulphide film",
    partClass: "capacitor",
    tolerance: 0.05,
    drift: either(0.015 / overRange),
  },
  {
    id: "polyester",
    label: "polyester film",
    partClass: "capacitor",
    tolerance: 0.1,
    drift: either(0.05 / overRange),
  },
  {
    id: "class-2",
    label: "class 2 ceramic",
    partClass: "capacitor",
    tolerance: 0.1,
    drift: either(0.15 / overRange),
  },
  {
    id: "carbon-pot",
    label: "carbon pot",
    partClass: "pot",
    tolerance: 0.2,
    drift: { least: -1500e-6, most: -300e-6 },
  },
  { id: "cermet", label: "cermet trimmer", partClass: "pot", tolerance: 0.1, drift: either(100e-6) },
];

/** The types that a part of this class may be, the usual one first. */
export const typesOf = (partClass: PartClass): readonly PartType[] =>
  partTypes.filter((type) => type.partClass === partClass);
