/** A label inside a sentence: its first letter small, unless that begins an abbreviation or a symbol (DC, RMS, Q). */
export const midSentence = (label: string) =>
  /^\p{Lu}\p{Ll}/u.test(label) ? label.charAt(0).toLocaleLowerCase("en") + label.slice(1) : label;
