const browsers: readonly [RegExp, string][] = [
  [/\bFirefox\//, "Firefox"],
  [/\bEdg\//, "Edge"],
  [/\bOPR\//, "Opera"],
  [/\b(Headless)?Chrom(e|ium)\//, "Chromium"],
  [/\bSafari\//, "Safari"],
  [/^curl\//, "curl"],
];
const systems: readonly [RegExp, string][] = [
  [/Android/, "Android"],
  [/iPhone|iPad/, "iOS"],
  [/Windows/, "Windows"],
  [/Mac OS X/, "macOS"],
  [/Linux/, "Linux"],
];

/** A browser in the words a person knows it by. */
export function browserName(agent: string | null): string {
  if (agent === null) return "A program that did not say its name";
  const browser = browsers.find(([sign]) => sign.test(agent))?.[1];
  const system = systems.find(([sign]) => sign.test(agent))?.[1];
  if (browser === undefined) return agent.slice(0, 60);
  return system === undefined ? browser : `${browser} on ${system}`;
}
