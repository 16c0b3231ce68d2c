import { mailChoices, type Queryable } from "#lib/db/index.ts";
import { and, eq, inArray } from "drizzle-orm";
import type { TeamPerson } from "../teams/people.ts";

/** Members whose name stands after an @ in the text, whatever its capitals. A longer name wins over one it begins with. */
export function mentionedIn(text: string, people: readonly TeamPerson[]): TeamPerson[] {
  const found = new Set<TeamPerson>();
  const byLength = [...people].sort((a, b) => b.name.length - a.name.length);
  const folded = text.toLocaleLowerCase("en");
  for (let at = folded.indexOf("@"); at !== -1; at = folded.indexOf("@", at + 1)) {
    const rest = folded.slice(at + 1);
    const person = byLength.find(({ name }) => {
      const wanted = name.toLocaleLowerCase("en");
      return rest.startsWith(wanted) && !/^[\p{L}\d]/u.test(rest.slice(wanted.length));
    });
    if (person) found.add(person);
  }
  return [...found];
}

/** Those among them who want a mail when they are mentioned. */
export async function wantingMail(db: Queryable, people: readonly TeamPerson[]): Promise<TeamPerson[]> {
  if (people.length === 0) return [];
  const ids = people.map(({ userId }) => userId);
  const rows = await db
    .select({ userId: mailChoices.userId })
    .from(mailChoices)
    .where(and(inArray(mailChoices.userId, ids), eq(mailChoices.mentions, false)));
  const without = new Set(rows.map(({ userId }) => userId));
  return people.filter(({ userId }) => !without.has(userId));
}
