import type { AnyTopology } from "#lib/circuit/index.ts";

/** A device without a designator yet, as the network's drawing names it: U where there is one op amp, U1, U2 for more. */
export function deviceName({ devices }: AnyTopology, device: AnyTopology["devices"][number]): string {
  const alike = devices.filter(({ letter }) => letter === device.letter);
  return alike.length === 1 ? device.letter : `${device.letter}${alike.indexOf(device) + 1}`;
}
