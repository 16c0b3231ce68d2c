export const longestStageName = 120;

/** What keeps this text from being the name of a stage; spaces at its ends are left aside. */
export function stageNameFault(text: string): string | undefined {
  const name = text.trim();
  if (name === "") return "Give the stage a name, such as Body or Snap.";
  if (name.length > longestStageName) return `Use at most ${longestStageName} characters.`;
  if (/\p{Cc}/u.test(name)) return "Leave out line breaks and other control characters.";
  return undefined;
}
