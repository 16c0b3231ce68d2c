import { designatorLetters, type AnyTopology } from "#lib/circuit/index.ts";
import { deviceClasses } from "#lib/circuit/device/classes.ts";

/**
 * Class letters and a number without leading zeros (IEEE 315): R for resistors, C for capacitors, RV for pots, and those
 * of devices. One device of several in a package has a letter behind: U3B.
 *
 * @returns what is wrong with it; undefined where nothing is
 */
export function designatorFault(topology: AnyTopology, key: string, text: string): string | undefined {
  const part = topology.parts[key];
  if (part) return faultOf(designatorLetters[part.partClass], 1, text);
  const device = topology.devices.find((one) => one.key === key);
  if (device) return faultOf(device.letter, deviceClasses[device.deviceClass].perPackage, text);
  return "There is no such part in this topology.";
}

function faultOf(letters: string, perPackage: number, text: string): string | undefined {
  const unit = perPackage > 1 ? `[A-${"ABCDEFGH"[perPackage - 1]}]?` : "";
  if (new RegExp(`^${letters}[1-9]\\d{0,4}${unit}$`).test(text)) return undefined;
  return `Write ${letters} and a number, such as ${letters}12${perPackage > 1 ? " or " + letters + "12A" : ""}.`;
}

const inOrder = new Intl.Collator("en", { numeric: true }).compare;

/** R2 before R14, and a part without a designator after all that have one. */
export function compareDesignators(a: string | undefined, b: string | undefined): number {
  if (a === undefined || b === undefined) return Number(a === undefined) - Number(b === undefined);
  return inOrder(a, b);
}
