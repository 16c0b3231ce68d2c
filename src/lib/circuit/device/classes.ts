/**
 * Generic classes of devices: what a package holds, and what each device of it draws from both rails at rest. Currents
 * are class figures from memory; the data sheet of the part in hand goes before them.
 */
interface ClassFigures {
  /** Devices of this sort in one package. */
  perPackage: number;
  /** A from each rail for one device, its bias current apart; absent where it draws nothing of its own. */
  quiescent?: { typical: number; most: number };
}

const opAmp = { typical: 1.4e-3, most: 2.5e-3 };
const transconductance = { typical: 1.05e-3, most: 2e-3 };

const classes = {
  "JFET-input op amp": { perPackage: 1, quiescent: opAmp },
  "JFET-input op amp, one of two in a package": { perPackage: 2, quiescent: opAmp },
  "JFET-input op amp, one of four in a package": { perPackage: 4, quiescent: opAmp },
  "bipolar transconductance amplifier, one of two": { perPackage: 2, quiescent: transconductance },
  "bipolar transconductance amplifier with buffer, one of two": { perPackage: 2, quiescent: transconductance },
  "general-purpose NPN": { perPackage: 1 },
  "general-purpose NPN, selected": { perPackage: 1 },
  "general-purpose PNP": { perPackage: 1 },
  "general-purpose PNP, half of a matched pair": { perPackage: 2 },
  "small-signal diode": { perPackage: 1 },
} as const satisfies Record<string, ClassFigures>;

export type DeviceClass = keyof typeof classes;

export const deviceClasses: Readonly<Record<DeviceClass, ClassFigures>> = classes;

/** What a package of the class is called where packages are counted. */
export const packageName = (deviceClass: DeviceClass): string =>
  deviceClass
    .replace(/, one of two( in a package)?$/, ", two in a package")
    .replace(/, one of four in a package$/, ", four in a package")
    .replace(/, half of a matched pair$/, ", matched pair");
