import { letter, type Letter } from "./letters.ts";

interface Mention {
  name: string;
  author: string;
  voice: string;
  number: number;
  text: string;
  url: string;
  /** Stops such mails without a sign-in. */
  unsubscribe: string;
}

export function mentionLetter({ name, author, voice, number, text, url, unsubscribe }: Mention): Letter {
  const made = letter({
    subject: `${author} mentioned you on revision ${number} of ${voice}`,
    greeting: `Hello ${name},`,
    paragraphs: [`${author} wrote on revision ${number} of ${voice}:`, text],
    action: { label: "Read and answer", url },
    closing: `You get this because your name stands in the remark. No more of these mails: ${unsubscribe}`,
  });
  return { ...made, unsubscribe };
}
