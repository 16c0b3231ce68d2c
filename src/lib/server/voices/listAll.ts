import type { VoiceAnswer } from "#lib/wire/voice.ts";
import type { Context } from "../context.ts";
import { listVoices } from "./list.ts";

/** Every voice of the team, newest change first: its page sorts and filters them all on the spot. */
export async function listAllVoices({ ctx }: { ctx: Context }): Promise<VoiceAnswer[]> {
  const all: VoiceAnswer[] = [];
  let cursor: string | undefined;
  do {
    const page = await listVoices({ ctx, input: { limit: 200, sort: "updated", cursor } });
    all.push(...page.voices);
    cursor = page.nextCursor ?? undefined;
  } while (cursor !== undefined);
  return all;
}
